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
	const all = occurrences({ ...series, toOn: key.slice(0, 10), limit: 5000 });
	if (!all.ok) return all;
	const at = all.occurrences.findIndex((occurrence) => occurrence.key === key);
	if (at < 0) return refuse('not-an-occurrence');
	if (at === 0) return refuse('first-occurrence');
	const read = readRule(series.rule);
	if (!read.ok) return read;
	const { count } = read.rule;
	const rest = ruleText({ ...read.rule, count: count === null ? null : count - at });
	return {
		ok: true,
		before: { rule: endRuleBefore(series.rule, key.slice(0, 10)) },
		after: { startLocal: key, rule: rest }
	};
}
