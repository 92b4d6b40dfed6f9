import type { RuleDay, RuleSaid, Weekday } from '$lib/domain/calendar';
import * as m from './compiled/messages';
import type { Formats } from './formats';

type RuleFormats = Pick<Formats, 'date' | 'list' | 'month' | 'weekday'>;

/** A rule as a sentence without its full stop: "Every Monday and Wednesday, until Thursday 24 December 2026". */
export function ruleWords(said: RuleSaid, f: RuleFormats): string {
	const days = said.days.map((day) => dayWord(day, said.unit, f));
	const monthDays = said.monthDays.map(monthDayWord);
	const [on, only] =
		said.unit === 'day'
			? [[], [days, monthDays]]
			: days.length > 0
				? [days, [monthDays]]
				: [monthDays, []];
	let words = stepWords(said, f.list(on));
	for (const limit of only)
		if (limit.length > 0) words = m.plan_rule_only({ said: words, days: f.list(limit) });
	if (said.months.length > 0) {
		const months = f.list(said.months.map((month) => f.month(civil(month, 1))));
		words = m.plan_rule_in_months({ said: words, months });
	}
	return withEnd(words, said.end, f);
}

function stepWords({ unit, every }: RuleSaid, days: string): string {
	if (unit === 'day') return every === 1 ? m.plan_rule_daily() : m.plan_rule_daily_every({ every });
	if (unit === 'week') {
		if (!days) return every === 1 ? m.plan_rule_weekly() : m.plan_rule_weekly_every({ every });
		return every === 1
			? m.plan_rule_weekly_on({ days })
			: m.plan_rule_weekly_every_on({ every, days });
	}
	if (!days) return every === 1 ? m.plan_rule_monthly() : m.plan_rule_monthly_every({ every });
	return every === 1
		? m.plan_rule_monthly_on({ days })
		: m.plan_rule_monthly_every_on({ every, days });
}

function withEnd(said: string, end: RuleSaid['end'], f: RuleFormats): string {
	if (end.kind === 'never') return said;
	if (end.kind === 'until') return m.plan_rule_until({ said, date: f.date(end.on) });
	return end.count === 1
		? m.plan_rule_once({ said })
		: m.plan_rule_times({ said, count: end.count });
}

const ordinals: Record<number, (blanks: { day: string }) => string> = {
	1: m.plan_rule_first,
	2: m.plan_rule_second,
	3: m.plan_rule_third,
	4: m.plan_rule_fourth,
	5: m.plan_rule_fifth,
	[-1]: m.plan_rule_last
};

function dayWord({ ordinal, day: name }: RuleDay, unit: RuleSaid['unit'], f: RuleFormats): string {
	const day = f.weekday(civil(1, 1 + order.indexOf(name)));
	if (ordinal === null) return unit === 'month' ? m.plan_rule_each({ day }) : day;
	return ordinals[ordinal]?.({ day }) ?? m.plan_rule_from_end({ day, nth: -ordinal });
}

const order: readonly Weekday[] = ['MO', 'TU', 'WE', 'TH', 'FR', 'SA', 'SU'];

const monthDayWord = (day: number): string =>
	day > 0
		? m.plan_rule_month_day({ day })
		: day === -1
			? m.plan_rule_month_day_last()
			: m.plan_rule_month_day_from_end({ day: -day });

/** A day of January 2024, which began on a Monday, or the first of another month. */
const civil = (month: number, day: number): string =>
	`2024-${String(month).padStart(2, '0')}-${String(day).padStart(2, '0')}`;
