import { clockWarnings } from './clock-warnings';
import { occurrences, type Occurrence, type OccurrencesRefused } from './occurrences';
import { pickedRuleText, type PickedRule } from './picked-rule';
import { sayRule, type RuleSaid } from './say-rule';
import type { Refused } from '../refusal';

/** What a form for a recurring class holds of its dates. */
export type PickedDates = PickedRule & {
	startsOn: string;
	startTime: string;
	lengthMin: number;
};

export type NextDates = {
	text: string;
	said: RuleSaid;
	/** The first dates from `fromOn` on. */
	dates: Occurrence[];
	/** The rule goes on after them. */
	more: boolean;
	/** Those of the coming year that a clock change touches. */
	warnings: { occurrence: Occurrence; change: 'skipped' | 'twice' }[];
};

/** A year of a daily class. */
const looked = 366;

/** What a picked rule comes to: its words, its next dates, and what clock changes do to them. */
export function nextDates(
	picked: PickedDates,
	{
		zone,
		weekStartsOn,
		fromOn,
		count = 8
	}: { zone: string; weekStartsOn: number; fromOn: string; count?: number }
): ({ ok: true } & NextDates) | OccurrencesRefused | Refused<'no-days'> {
	const rule = pickedRuleText(picked, picked.startsOn, weekStartsOn);
	if (!rule.ok) return rule;
	const said = sayRule(rule.text, zone);
	if (!said.ok) return said;
	const { startsOn, startTime, lengthMin } = picked;
	const startLocal = `${startsOn}T${startTime}`;
	const from = fromOn > startsOn ? fromOn : startsOn;
	const asked = { startLocal, zone, rule: rule.text, lengthMin, fromOn: from, limit: looked };
	const read = occurrences(asked);
	if (!read.ok) return read;
	return {
		ok: true,
		text: rule.text,
		said: said.said,
		dates: read.occurrences.slice(0, count),
		more: read.more || read.occurrences.length > count,
		warnings: clockWarnings(read.occurrences, zone)
	};
}
