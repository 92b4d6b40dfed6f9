import { describe, expect, it } from 'vitest';
import { pickedFrom, pickedRuleText, type PickedRule } from './picked-rule';

const picked = (more: Partial<PickedRule>): PickedRule => ({
	repeats: 'weekly',
	every: 1,
	days: ['MO', 'WE'],
	ends: 'never',
	typedRule: '',
	...more
});
const textOf = (more: Partial<PickedRule>, startsOn = '2026-12-01', weekStartsOn?: number) => {
	const made = pickedRuleText(picked(more), startsOn, weekStartsOn);
	return made.ok ? made.text : made.refused;
};

describe('a rule picked by days', () => {
	it('becomes an RFC 5545 rule', () => {
		expect(textOf({})).toBe('FREQ=WEEKLY;BYDAY=MO,WE');
		expect(textOf({ every: 2, days: ['FR', 'TU'] })).toBe('FREQ=WEEKLY;INTERVAL=2;BYDAY=TU,FR');
		expect(textOf({ repeats: 'daily', ends: 'count', count: 10 })).toBe('FREQ=DAILY;COUNT=10');
		expect(textOf({ ends: 'until', untilOn: '2027-03-31' })).toBe(
			'FREQ=WEEKLY;UNTIL=20270331;BYDAY=MO,WE'
		);
	});

	it('repeats monthly on the weekday of its start, a fifth one as the last', () => {
		expect(textOf({ repeats: 'monthly' }, '2026-12-08')).toBe('FREQ=MONTHLY;BYDAY=2TU');
		expect(textOf({ repeats: 'monthly' }, '2026-12-29')).toBe('FREQ=MONTHLY;BYDAY=-1TU');
	});

	it('counts every second week by the week of the gym', () => {
		expect(textOf({ every: 2 }, '2026-12-01', 7)).toBe(
			'FREQ=WEEKLY;INTERVAL=2;WKST=SU;BYDAY=MO,WE'
		);
	});

	it('needs a day', () => {
		expect(textOf({ days: [] })).toBe('no-days');
	});

	it('comes back into the fields that picked it, any other rule as typed', () => {
		for (const more of [{}, { every: 3 }, { ends: 'count', count: 12 } as const]) {
			expect(pickedFrom(textOf(more), '2026-12-01')).toEqual(picked(more));
		}
		const odd = 'FREQ=MONTHLY;BYMONTHDAY=1,15';
		expect(pickedFrom(odd, '2026-12-01')).toMatchObject({ repeats: 'typed', typedRule: odd });
	});
});
