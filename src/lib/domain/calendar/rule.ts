export const weekdays = ['MO', 'TU', 'WE', 'TH', 'FR', 'SA', 'SU'] as const;
export type Weekday = (typeof weekdays)[number];
export type Frequency = 'DAILY' | 'WEEKLY' | 'MONTHLY';

/** A weekday of a rule; `ordinal` 1 is the first of the month, -1 the last, null each. */
export type RuleDay = { ordinal: number | null; day: Weekday };

/** When a rule ends: with a civil day, at a wall-clock time, or at an instant; each included. */
export type Until =
	{ kind: 'date'; on: string } | { kind: 'local'; local: string } | { kind: 'instant'; at: number };

/** An RFC 5545 recurrence rule, within what is allowed here. */
export type Rule = {
	frequency: Frequency;
	/** 1 to 52. */
	interval: number;
	/** At most 400. */
	count: number | null;
	until: Until | null;
	days: RuleDay[];
	/** 1 to 31 from the front, -1 to -31 from the end. */
	monthDays: number[];
	months: number[];
	weekStart: Weekday;
};

export const longestRule = 256;
export const mostInterval = 52;
export const mostCount = 400;

const compact = (iso: string): string => iso.replace(/[-:]/g, '');

/** The rule as text, in one form whatever order it was read in. */
export function ruleText(rule: Rule): string {
	const parts = [
		`FREQ=${rule.frequency}`,
		rule.interval > 1 && `INTERVAL=${rule.interval}`,
		rule.count !== null && `COUNT=${rule.count}`,
		rule.until && `UNTIL=${untilText(rule.until)}`,
		rule.weekStart !== 'MO' && `WKST=${rule.weekStart}`,
		rule.months.length > 0 && `BYMONTH=${rule.months.join(',')}`,
		rule.monthDays.length > 0 && `BYMONTHDAY=${rule.monthDays.join(',')}`,
		rule.days.length > 0 && `BYDAY=${rule.days.map((d) => `${d.ordinal ?? ''}${d.day}`).join(',')}`
	];
	return parts.filter(Boolean).join(';');
}

function untilText(until: Until): string {
	if (until.kind === 'date') return compact(until.on);
	if (until.kind === 'local') return compact(until.local);
	return `${compact(new Date(until.at).toISOString().slice(0, 19))}Z`;
}
