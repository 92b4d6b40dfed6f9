import { describe, expect, it } from 'vitest';
import { clockWarnings, isClosedOn, occurrences, type Recurrence } from '.';

const zone = 'Europe/Dublin';
/** Mondays and Wednesdays at 18:40 for an hour, from Monday 30 November 2026. */
const asked = (over: Partial<Recurrence> = {}): Recurrence => ({
	startLocal: '2026-11-30T18:40',
	zone,
	rule: 'FREQ=WEEKLY;BYDAY=MO,WE;COUNT=6',
	lengthMin: 60,
	...over
});
const listed = (over: Partial<Recurrence> = {}) => {
	const result = occurrences(asked(over));
	if (!result.ok) throw new Error(result.refused);
	return result.occurrences;
};
const days = (over: Partial<Recurrence> = {}) => listed(over).map((o) => o.startsOn.slice(5));

describe('when a series takes place', () => {
	it('gives each occurrence its key, wall clock and instants', () => {
		expect(listed()[0]).toEqual({
			key: '2026-11-30T18:40',
			localStart: '2026-11-30T18:40',
			startsOn: '2026-11-30',
			startTime: '18:40',
			startsAt: Date.parse('2026-11-30T18:40:00Z'),
			endsAt: Date.parse('2026-11-30T19:40:00Z'),
			isInGap: false
		});
		expect(days()).toEqual(['11-30', '12-02', '12-07', '12-09', '12-14', '12-16']);
	});

	it('starts with the first day on which the rule falls', () => {
		expect(days({ startLocal: '2026-12-01T18:40', rule: 'FREQ=WEEKLY;BYDAY=MO;COUNT=2' })).toEqual([
			'12-07',
			'12-14'
		]);
	});

	it('is once where there is no rule', () => {
		expect(days({ rule: null })).toEqual(['11-30']);
	});

	it('keeps to the days asked for, both included', () => {
		expect(days({ fromOn: '2026-12-02', toOn: '2026-12-09' })).toEqual(['12-02', '12-07', '12-09']);
	});

	it('leaves out closed days, exceptions and what was called off, and they use up the count', () => {
		const closures = [{ fromOn: '2026-12-07', toOn: '2026-12-08' }];
		const over = { closures, exdates: ['2026-12-02T18:40'], cancelled: ['2026-12-14T18:40'] };
		expect(days(over)).toEqual(['11-30', '12-09', '12-16']);
	});

	it('closes one room without the others', () => {
		const closures = [{ fromOn: '2026-12-02', toOn: '2026-12-02', roomId: 2 }];
		expect(days({ closures, roomId: 2 })).not.toContain('12-02');
		expect(days({ closures, roomId: 1 })).toContain('12-02');
		expect(isClosedOn(closures, '2026-12-02')).toBe(false);
	});

	it('shows a moved occurrence where it went, by the key that it came from', () => {
		const moved = {
			'2026-12-02T18:40': { startLocal: '2026-12-03T07:00', lengthMin: 45 },
			'2026-12-07T18:40': { startLocal: '2026-12-20T10:00' }
		};
		expect(listed({ moved }).map((o) => `${o.key} ${o.localStart}`)).toEqual([
			'2026-11-30T18:40 2026-11-30T18:40',
			'2026-12-02T18:40 2026-12-03T07:00',
			'2026-12-09T18:40 2026-12-09T18:40',
			'2026-12-14T18:40 2026-12-14T18:40',
			'2026-12-16T18:40 2026-12-16T18:40',
			'2026-12-07T18:40 2026-12-20T10:00'
		]);
		const [only] = listed({ moved, fromOn: '2026-12-03', toOn: '2026-12-03' });
		expect((only!.endsAt - only!.startsAt) / 60_000).toBe(45);
		expect(days({ moved, fromOn: '2026-12-20', toOn: '2026-12-20' })).toEqual(['12-20']);
		expect(days({ moved, fromOn: '2026-12-07', toOn: '2026-12-07' })).toEqual([]);
	});

	it('moves off a closed day, and not onto one', () => {
		const closures = [{ fromOn: '2026-12-02', toOn: '2026-12-02' }];
		const off = { '2026-12-02T18:40': { startLocal: '2026-12-03T18:40' } };
		const onto = { '2026-12-07T18:40': { startLocal: '2026-12-02T10:00' } };
		expect(days({ closures, moved: off })).toContain('12-03');
		expect(days({ closures, moved: onto })).not.toContain('12-02');
	});

	it('ends with the civil day of UNTIL, at a wall-clock time, or at an instant, each included', () => {
		const until = (end: string) => days({ rule: `FREQ=WEEKLY;BYDAY=MO,WE;UNTIL=${end}` }).at(-1);
		expect(until('20261209')).toBe('12-09');
		expect(until('20261209T184000')).toBe('12-09');
		expect(until('20261209T183959')).toBe('12-07');
		expect(until('20261209T184000Z')).toBe('12-09');
		expect(until('20261209T183959Z')).toBe('12-07');
	});

	it('compares an UNTIL in UTC as an instant, in zones far from it', () => {
		// 18:00 in Sydney on Monday 7 December is 07:00 UTC; in Los Angeles it is 02:00 UTC on the 8th.
		const last = (zone: string, until: string) =>
			days({ zone, startLocal: '2026-11-30T18:00', rule: `FREQ=WEEKLY;UNTIL=${until}` }).at(-1);
		expect(last('Australia/Sydney', '20261207T070000Z')).toBe('12-07');
		expect(last('Australia/Sydney', '20261207T065959Z')).toBe('11-30');
		expect(last('America/Los_Angeles', '20261208T020000Z')).toBe('12-07');
		expect(last('America/Los_Angeles', '20261208T015959Z')).toBe('11-30');
	});

	it('says that there is more where it stopped before the end', () => {
		const more = (over: Partial<Recurrence>) => {
			const result = occurrences(asked(over));
			return result.ok && result.more;
		};
		expect(more({ limit: 6 })).toBe(false);
		expect(more({ limit: 5 })).toBe(true);
		expect(more({ rule: 'FREQ=DAILY' })).toBe(true);
		expect(more({ rule: 'FREQ=DAILY', toOn: '2027-11-30' })).toBe(false);
		expect(more({ rule: 'FREQ=WEEKLY;INTERVAL=2;COUNT=400' })).toBe(false);
		expect(more({ rule: 'FREQ=WEEKLY;INTERVAL=3;COUNT=400' })).toBe(true);
	});

	it('drops the day that a zone skipped instead of doubling the next', () => {
		// Samoa went from 29 to 31 December 2011.
		const dates = days({
			startLocal: '2011-12-28T18:00',
			zone: 'Pacific/Apia',
			rule: 'FREQ=DAILY;COUNT=5'
		});
		expect(dates).toEqual(['12-28', '12-29', '12-31', '01-01']);
	});

	it.each([
		[{ startLocal: '2026-02-30T18:40' }, 'bad-start'],
		[{ startLocal: '2026-11-30 18:40' }, 'bad-start'],
		[{ startLocal: '2026-11-30T24:00' }, 'bad-start'],
		[{ startLocal: '0000-01-01T00:00' }, 'bad-start'],
		[{ zone: 'Mars/Olympus' }, 'unknown-zone'],
		[{ zone: '+01:00' }, 'unknown-zone'],
		[{ zone: '' }, 'unknown-zone'],
		[{ lengthMin: 1441 }, 'bad-length'],
		[{ lengthMin: 0.5 }, 'bad-length'],
		[{ fromOn: '2026-13-01' }, 'bad-range'],
		[{ limit: 5001 }, 'bad-range'],
		[{ rule: 'FREQ=YEARLY' }, 'rule-unreadable'],
		[{ rule: 'FREQ=DAILY;UNTIL=20261129' }, 'ends-before-start'],
		[{ rule: 'FREQ=DAILY;UNTIL=20261130T183959Z' }, 'ends-before-start'],
		[{ exdates: ['tomorrow'] }, 'bad-start'],
		[{ moved: { '2026-12-02T18:40': { startLocal: '', lengthMin: 60 } } }, 'bad-start']
	] as [Partial<Recurrence>, string][])('refuses %j: %s', (over, refused) => {
		expect(occurrences(asked(over))).toMatchObject({ ok: false, refused });
	});
});

describe('what the editor warns of', () => {
	it('names the dates whose time a clock change skips or brings twice', () => {
		const nightly = listed({
			startLocal: '2026-03-27T01:30',
			rule: 'FREQ=DAILY',
			toOn: '2026-10-31'
		});
		const warned = clockWarnings(nightly, zone).map((w) => [w.occurrence.key, w.change]);
		expect(warned).toEqual([
			['2026-03-29T01:30', 'skipped'],
			['2026-10-25T01:30', 'twice']
		]);
		expect(nightly.find((o) => o.isInGap)!.localStart).toBe('2026-03-29T02:30');
	});

	it('is silent for a class in the evening', () => {
		expect(clockWarnings(listed(), zone)).toEqual([]);
	});
});
