import type { z } from 'zod';
import * as m from './compiled/messages';
import { refusalSentence } from './refusals';

/** What is wrong with one field, in words. A schema's own message is the code of a refusal. */
export function fieldSentence(issue: z.core.$ZodIssue): string {
	if (/^[a-z]+(-[a-z]+)*$/.test(issue.message)) return refusalSentence(issue.message);
	switch (issue.code) {
		case 'invalid_type':
			return m.common_field_missing();
		case 'too_small':
			return tooSmall(issue.origin, Number(issue.minimum));
		case 'too_big':
			return issue.origin === 'string'
				? m.common_field_too_long({ most: Number(issue.maximum) })
				: m.common_field_too_much({ most: Number(issue.maximum) });
		default:
			return m.common_field_odd();
	}
}

function tooSmall(origin: string, least: number): string {
	if (origin !== 'string') return m.common_field_too_little({ least });
	return least <= 1 ? m.common_field_missing() : m.common_field_too_short({ least });
}
