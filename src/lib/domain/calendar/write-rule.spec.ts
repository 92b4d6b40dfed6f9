import { describe, expect, it } from 'vitest';
import {
	endRuleBefore,
	readRule,
	sayRule,
	splitSeries,
	writeRule,
	occurrences,
	type RuleDraft
} from '.';

const text = (draft: Partial<RuleDraft>) => {
	const result = writeRule({ every: 1, unit: 'week', ...draft });
	return result.ok ? result.text : `${result.refused} ${result.detail?.part}`;
};

describe('a rule built by picking days', () => {
	it('is weekly on those days, in the order of the week', () => {
		expect(text({ days: ['WE', 'MO'] })).toBe('FREQ=WEEKLY;BYDAY=MO,WE');
	});

	it('ends with a day or after so many times', () => {
		expect(text({ days: ['MO'], untilOn: '2026-12-24' })).toBe(
			'FREQ=WEEKLY;UNTIL=20261224;BYDAY=MO'
		);
		expect(text({ days: ['MO'], count: 8 })).toBe('FREQ=WEEKLY;COUNT=8;BYDAY=MO');
	});

	it('counts every second week from the day on which the gym starts its weeks', () => {
		expect(text({ every: 2, days: ['SU', 'TU'], weekStartsOn: 7 })).toBe(
			'FREQ=WEEKLY;INTERVAL=2;WKST=SU;BYDAY=TU,SU'
		);
		expect(text({ every: 2, days: ['TU'] })).toBe('FREQ=WEEKLY;INTERVAL=2;BYDAY=TU');
	});

	it('is monthly on the first Friday, or daily', () => {
		expect(text({ unit: 'month', days: ['1FR'] })).toBe('FREQ=MONTHLY;BYDAY=1FR');
		expect(text({ unit: 'day' })).toBe('FREQ=DAILY');
	});

	it.each([
		[{ every: 0 }, 'rule-unreadable INTERVAL'],
		[{ every: 53 }, 'rule-unreadable INTERVAL'],
		[{ every: 1.5 }, 'rule-unreadable INTERVAL'],
		[{ days: ['XX'] }, 'rule-unreadable BYDAY'],
		[{ days: ['MO;COUNT=3'] }, 'rule-unreadable BYDAY'],
		[{ days: ['1MO'] }, 'rule-unreadable BYDAY'],
		[{ count: 401 }, 'rule-unreadable COUNT'],
		[{ untilOn: '2026-02-30' }, 'rule-unreadable UNTIL'],
		[{ untilOn: '2026-12-24', count: 3 }, 'rule-unreadable UNTIL'],
		[{ every: 2, weekStartsOn: 8 }, 'rule-unreadable WKST']
	] as [Partial<RuleDraft>, string][])('refuses %j', (draft, refused) => {
		expect(text(draft)).toBe(refused);
	});
});

describe('a rule in words', () => {
	const said = (rule: string) => sayRule(rule, 'Europe/Dublin');

	it('says its days, its step and its end', () => {
		expect(said('FREQ=WEEKLY;INTERVAL=2;BYDAY=MO,WE;COUNT=8')).toEqual({
			ok: true,
			said: {
				unit: 'week',
				every: 2,
				days: [
					{ ordinal: null, day: 'MO' },
					{ ordinal: null, day: 'WE' }
				],
				monthDays: [],
				months: [],
				end: { kind: 'count', count: 8 }
			}
		});
		expect(said('FREQ=DAILY')).toMatchObject({ said: { unit: 'day', end: { kind: 'never' } } });
	});

	it('says the last day as the gym has it', () => {
		const end = (until: string) => {
			const result = said(`FREQ=DAILY;UNTIL=${until}`);
			return result.ok && result.said.end;
		};
		expect(end('20260630')).toEqual({ kind: 'until', on: '2026-06-30' });
		expect(end('20260630T120000')).toEqual({ kind: 'until', on: '2026-06-30' });
		expect(end('20260630T233000Z')).toEqual({ kind: 'until', on: '2026-07-01' });
	});

	it('is refused where it cannot be read', () => {
		expect(said('every Monday')).toMatchObject({ refused: 'rule-unreadable' });
	});
});

describe('this and following', () => {
	const series = { startLocal: '2026-11-30T18:40', zone: 'Europe/Dublin' };
	const keys = (rule: string, startLocal = series.startLocal) => {
		const result = occurrences({ ...series, startLocal, rule, toOn: '2027-12-31' });
		if (!result.ok) throw new Error(result.refused);
		return result.occurrences.map((o) => o.key);
	};

	it.each([
		'FREQ=WEEKLY;BYDAY=MO,WE',
		'FREQ=WEEKLY;INTERVAL=2;BYDAY=MO,WE;WKST=SU',
		'FREQ=WEEKLY;BYDAY=MO,WE;COUNT=20',
		'FREQ=DAILY;INTERVAL=3;UNTIL=20270401',
		'FREQ=MONTHLY;UNTIL=20270930T180000Z',
		'FREQ=MONTHLY;INTERVAL=2;BYDAY=MO,-1WE'
	])('parts %s into two that together are the whole', (rule) => {
		const whole = keys(rule);
		const at = whole[3]!;
		const split = splitSeries({ ...series, rule }, at);
		if (!split.ok) throw new Error(split.refused);
		expect(split.after.startLocal).toBe(at);
		expect([...keys(split.before.rule), ...keys(split.after.rule, at)]).toEqual(whole);
		expect(keys(split.before.rule)).toEqual(whole.slice(0, 3));
	});

	it('is refused for the first of a series and for a day that is none of its', () => {
		const rule = 'FREQ=WEEKLY;BYDAY=MO';
		const refused = (key: string) => splitSeries({ ...series, rule }, key);
		expect(refused('2026-11-30T18:40')).toMatchObject({ refused: 'first-occurrence' });
		expect(refused('2026-12-08T18:40')).toMatchObject({ refused: 'not-an-occurrence' });
		expect(refused('2026-12-07T19:00')).toMatchObject({ refused: 'not-an-occurrence' });
		expect(refused('someday')).toMatchObject({ ok: false });
	});

	it('ends a rule the day before, unless it ended already', () => {
		const end = (rule: string) => endRuleBefore(rule, '2026-12-14');
		expect(end('FREQ=DAILY;COUNT=90')).toBe('FREQ=DAILY;UNTIL=20261213');
		expect(end('FREQ=DAILY;UNTIL=20270101')).toBe('FREQ=DAILY;UNTIL=20261213');
		for (const ended of ['20261201', '20261201T184000', '20261201T184000Z'])
			expect(end(`FREQ=DAILY;UNTIL=${ended}`)).toBe(`FREQ=DAILY;UNTIL=${ended}`);
		expect(end('nonsense')).toBe('nonsense');
	});

	it('keeps every rule that it writes readable', () => {
		expect(readRule(endRuleBefore('FREQ=MONTHLY;BYDAY=-1SU;BYMONTH=1,7', '2026-12-14')).ok).toBe(
			true
		);
	});
});
