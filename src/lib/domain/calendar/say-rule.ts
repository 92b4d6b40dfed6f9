import { readRule, type RuleRefused } from './read-rule';
import type { RuleDay } from './rule';
import { localDateOf } from './zone';

/** A rule ready to be put in words. */
export type RuleSaid = {
	unit: 'day' | 'week' | 'month';
	/** Every so many units. */
	every: number;
	/** Empty: the start's own day. */
	days: RuleDay[];
	monthDays: number[];
	/** 1 to 12; empty: each. */
	months: number[];
	end: { kind: 'never' } | { kind: 'count'; count: number } | { kind: 'until'; on: string };
};

const units = { DAILY: 'day', WEEKLY: 'week', MONTHLY: 'month' } as const;

/** What a rule says, with the gym's civil day of its end. */
export function sayRule(text: string, zone: string): { ok: true; said: RuleSaid } | RuleRefused {
	const read = readRule(text);
	if (!read.ok) return read;
	const { frequency, interval, count, until, days, monthDays, months } = read.rule;
	const end: RuleSaid['end'] =
		count !== null
			? { kind: 'count', count }
			: until === null
				? { kind: 'never' }
				: {
						kind: 'until',
						on:
							until.kind === 'date'
								? until.on
								: until.kind === 'local'
									? until.local.slice(0, 10)
									: localDateOf(until.at, zone)
					};
	return {
		ok: true,
		said: { unit: units[frequency], every: interval, days, monthDays, months, end }
	};
}
