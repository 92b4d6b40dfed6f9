import { refuse, type Refused } from '../refusal';
import { occurrences, type OccurrencesRefused } from './occurrences';
import { readRule } from './read-rule';
import { ruleText } from './rule';
import { endRuleBefore } from './write-rule';

/**
 * "This and following": the rule that ends the series before the occurrence with this key, and the
 * one that starts there. A COUNT is shared out between the two. Refused where the key is none of
 * the series, or its first: then it is the whole series that changes.
 */
export function splitSeries(
	series: { startLocal: string; zone: string; rule: string },
	key: string
):
	| { ok: true; before: { rule: string }; after: { startLocal: string; rule: string } }
	| OccurrencesRefused
	| Refused<'not-an-occurrence' | 'first-occurrence'> {
	const on = key.slice(0, 10);
	const read = readRule(series.rule);
	if (!read.ok) return read;
	const { count } = read.rule;
	const [first, here, before] = [
		occurrences({ ...series, limit: 1 }),
		occurrences({ ...series, fromOn: on, toOn: on }),
		count === null ? null : occurrences({ ...series, toOn: on })
	];
	if (!first.ok) return first;
	if (!here.ok) return here;
	if (first.occurrences[0]?.key === key) return refuse('first-occurrence');
	if (!here.occurrences.some((o) => o.key === key)) return refuse('not-an-occurrence');
	const left = count === null || !before?.ok ? null : count - before.occurrences.length + 1;
	return {
		ok: true,
		before: { rule: endRuleBefore(series.rule, on) },
		after: { startLocal: key, rule: ruleText({ ...read.rule, count: left }) }
	};
}
