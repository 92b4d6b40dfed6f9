import { describe, expect, it } from 'vitest';
import { instantOf } from '../calendar/zone';
import { bookingWindow, cancelKind, cutOffAt } from '.';

const zone = 'Europe/Dublin';
const slot = (on: string, time: string) => ({
	startsOn: on,
	startsAt: instantOf(on, time, zone),
	zone
});
const iso = (at: number) => new Date(at).toISOString();
const minute = 60_000;

describe('when a class can be booked', () => {
	it("opens with the gym's day so many days before, and closes at the start or before it", () => {
		const { opensAt, closesAt } = bookingWindow({
			...slot('2026-12-01', '18:40'),
			opensDaysBefore: 28,
			closesMinBefore: 15
		});
		expect([iso(opensAt), iso(closesAt)]).toEqual([
			'2026-11-03T00:00:00.000Z',
			'2026-12-01T18:25:00.000Z'
		]);
	});

	it('opens at midnight of the wall clock across a clock change', () => {
		// Summer time ends in Dublin on 25 October 2026.
		const { opensAt } = bookingWindow({
			...slot('2026-10-27', '07:00'),
			opensDaysBefore: 7,
			closesMinBefore: 0
		});
		expect(iso(opensAt)).toBe('2026-10-19T23:00:00.000Z');
	});

	it('opens at the first moment of a day whose midnight is skipped', () => {
		// Santiago went from 24:00 on 5 September 2026 to 01:00.
		const startsAt = instantOf('2026-09-07', '07:00', 'America/Santiago');
		const { opensAt } = bookingWindow({
			startsOn: '2026-09-07',
			startsAt,
			zone: 'America/Santiago',
			opensDaysBefore: 1,
			closesMinBefore: 0
		});
		expect(iso(opensAt)).toBe('2026-09-06T04:00:00.000Z');
	});
});

describe('the cut-off', () => {
	it('is minutes before the start, or a clock time on the day before', () => {
		const monday = slot('2026-12-07', '06:30');
		expect(iso(cutOffAt({ ...monday, cutOffMin: 120, cutOffClock: null }))).toBe(
			'2026-12-07T04:30:00.000Z'
		);
		expect(iso(cutOffAt({ ...monday, cutOffMin: null, cutOffClock: '20:00' }))).toBe(
			'2026-12-06T20:00:00.000Z'
		);
	});

	it('keeps its clock time on the eve of a clock change', () => {
		const sunday = slot('2026-03-29', '10:00');
		const at = cutOffAt({ ...sunday, cutOffMin: null, cutOffClock: '20:00' });
		expect(iso(at)).toBe('2026-03-28T20:00:00.000Z');
		expect(sunday.startsAt - at).toBe(13 * 60 * minute);
	});

	it('counts minutes in real time', () => {
		const sunday = slot('2026-03-29', '02:30');
		const at = cutOffAt({ ...sunday, cutOffMin: 120, cutOffClock: null });
		expect(iso(at)).toBe('2026-03-28T23:30:00.000Z');
	});

	it('is itself still in time; a millisecond later is late', () => {
		expect([999, 1000, 1001].map((now) => cancelKind(now, 1000))).toEqual([
			'cancelled',
			'cancelled',
			'late-cancelled'
		]);
	});
});
