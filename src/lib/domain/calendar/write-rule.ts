import { addDays, isCivilDate } from './civil-date';
import { because, readRule, type RuleRefused } from './read-rule';
import { ruleText, weekdays, type Rule } from './rule';

/** A rule as a form asks for it. */
export type RuleDraft = {
	/** Every so many units, 1 to 52. */
	every: number;
	unit: 'day' | 'week' | 'month';
	/** "MO" to "SU", in months with an ordinal ("1FR", "-1SU"); left out for the start's own day. */
	days?: readonly string[];
	/** Last civil day, included. */
	untilOn?: string;
	count?: number;
	/** First day of the gym's week (ISO 8601, 1 to 7): decides which weeks every second week means. */
	weekStartsOn?: number;
};

const frequencies = { day: 'DAILY', week: 'WEEKLY', month: 'MONTHLY' } as const;

/** The rule that a form's fields mean, as text; refused like any rule where a field is out of bounds. */
export function writeRule(draft: RuleDraft): { ok: true; text: string } | RuleRefused {
	const { every, unit, days = [], untilOn, count, weekStartsOn = 1 } = draft;
	if (!days.every((day) => /^-?\d?[A-Z]{2}$/.test(day))) return because('value', 'BYDAY');
	if (untilOn !== undefined && !isCivilDate(untilOn)) return because('value', 'UNTIL');
	const parts = [
		`FREQ=${frequencies[unit]}`,
		`INTERVAL=${every}`,
		count !== undefined && `COUNT=${count}`,
		untilOn && `UNTIL=${untilOn.replaceAll('-', '')}`,
		unit === 'week' && every > 1 && `WKST=${weekdays[weekStartsOn - 1]}`,
		days.length > 0 && `BYDAY=${days.join(',')}`
	];
	const read = readRule(parts.filter(Boolean).join(';'));
	return read.ok ? { ok: true, text: ruleText(inWeekOrder(read.rule)) } : read;
}

function inWeekOrder(rule: Rule): Rule {
	const days = [...rule.days].sort((a, b) => weekdays.indexOf(a.day) - weekdays.indexOf(b.day));
	return { ...rule, days };
}

/**
 * The rule, ended with the day before `on` (COUNT dropped), or where it ended already if that was
 * sooner. What is not a rule stays as it is.
 */
export function endRuleBefore(text: string, on: string): string {
	const read = readRule(text);
	if (!read.ok) return text;
	const lastOn = addDays(on, -1);
	const { until } = read.rule;
	const endedOn =
		until?.kind === 'date'
			? until.on
			: until?.kind === 'local'
				? until.local.slice(0, 10)
				: until && new Date(until.at).toISOString().slice(0, 10);
	if (endedOn && endedOn < lastOn) return text;
	return ruleText({ ...read.rule, count: null, until: { kind: 'date', on: lastOn } });
}
