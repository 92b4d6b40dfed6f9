import { refuse, type Refused } from '../refusal';
import { weekday } from './civil-date';
import { readRule, type RuleRefused } from './read-rule';
import { ruleText, weekdays, type Weekday } from './rule';
import { writeRule } from './write-rule';

/** A rule as somebody picks it; `typed` is one in RFC 5545's own words. */
export type PickedRule = {
	repeats: 'weekly' | 'daily' | 'monthly' | 'typed';
	every: number;
	/** Of a weekly rule. */
	days: readonly Weekday[];
	ends: 'never' | 'until' | 'count';
	untilOn?: string;
	count?: number;
	typedRule: string;
};

const units = { weekly: 'week', daily: 'day', monthly: 'month' } as const;

/**
 * The rule that was picked, as text. Monthly is the start's own weekday: the second Tuesday, or
 * the last where the start is a fifth. A weekly rule without days is refused.
 * @param weekStartsOn ISO 8601, 1 to 7: what "every second week" counts by
 */
export function pickedRuleText(
	picked: PickedRule,
	startsOn: string,
	weekStartsOn = 1
): { ok: true; text: string } | Refused<'no-days'> | RuleRefused {
	const { repeats, every, days, ends, untilOn, count, typedRule } = picked;
	if (repeats === 'typed') return { ok: true, text: typedRule };
	if (repeats === 'weekly' && days.length === 0) return refuse('no-days');
	return writeRule({
		every,
		unit: units[repeats],
		days: repeats === 'weekly' ? days : repeats === 'monthly' ? [dayOfMonth(startsOn)] : [],
		untilOn: ends === 'until' ? untilOn : undefined,
		count: ends === 'count' ? count : undefined,
		weekStartsOn
	});
}

/** "2TU" for the second Tuesday; a fifth is the last. */
function dayOfMonth(on: string): string {
	const nth = Math.ceil(Number(on.slice(8)) / 7);
	return `${nth === 5 ? -1 : nth}${weekdays[weekday(on) - 1]}`;
}

/** A stored rule in the fields that would pick it; `typed` where no fields would. */
export function pickedFrom(text: string, startsOn: string, weekStartsOn = 1): PickedRule {
	const typed = {
		repeats: 'typed',
		every: 1,
		days: [],
		ends: 'never',
		typedRule: text
	} as const;
	const read = readRule(text);
	if (!read.ok) return typed;
	const { frequency, interval, count, until, days } = read.rule;
	const picked: PickedRule = {
		repeats: ({ WEEKLY: 'weekly', DAILY: 'daily', MONTHLY: 'monthly' } as const)[frequency],
		every: interval,
		days: frequency === 'WEEKLY' ? days.map(({ day }) => day) : [],
		ends: count !== null ? 'count' : until ? 'until' : 'never',
		...(count !== null ? { count } : {}),
		...(until?.kind === 'date' ? { untilOn: until.on } : {}),
		typedRule: ''
	};
	const again = pickedRuleText(picked, startsOn, weekStartsOn);
	return again.ok && again.text === ruleText(read.rule) ? picked : typed;
}
