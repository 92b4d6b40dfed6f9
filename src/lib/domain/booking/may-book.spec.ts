import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { mayBook, overlapping } from '.';
import type { Asked } from './may-book';

const asked = (over: Partial<Asked> = {}): Asked => ({
	now: 500,
	startsAt: 1000,
	endsAt: 2000,
	cancelledAt: null,
	window: { opensAt: 100, closesAt: 900 },
	whoMayBook: 'anyone',
	byStaff: false,
	hasPass: false,
	...over
});
const answer = (over: Partial<Asked>) => {
	const result = mayBook(asked(over));
	return result.ok ? 'ok' : result.refused;
};

describe('who may book what, and when', () => {
	it('takes bookings from the opening to the closing, both included', () => {
		expect([99, 100, 900, 901, 999, 1000].map((now) => answer({ now }))).toEqual([
			'not-open-yet',
			'ok',
			'ok',
			'closed',
			'closed',
			'past'
		]);
	});

	it('lets the desk book outside the window until the class ends', () => {
		expect([0, 901, 1000, 1999, 2000].map((now) => answer({ now, byStaff: true }))).toEqual([
			'ok',
			'ok',
			'ok',
			'ok',
			'past'
		]);
	});

	it('books nobody into a class that was called off, not even the desk', () => {
		expect(answer({ cancelledAt: 1 })).toBe('cancelled');
		expect(answer({ cancelledAt: 1, byStaff: true })).toBe('cancelled');
	});

	it('keeps classes for pass holders and for staff to them', () => {
		expect(answer({ whoMayBook: 'pass-holders' })).toBe('pass-holders-only');
		expect(answer({ whoMayBook: 'pass-holders', hasPass: true })).toBe('ok');
		expect(answer({ whoMayBook: 'staff', hasPass: true })).toBe('staff-only');
		expect(answer({ whoMayBook: 'staff', isStaff: true })).toBe('ok');
		expect(answer({ whoMayBook: 'staff', byStaff: true })).toBe('ok');
	});
});

describe('two bookings of one person', () => {
	it('may touch, but not overlap', () => {
		const slot = { startsAt: 1000, endsAt: 2000 };
		const found = (startsAt: number, endsAt: number) =>
			overlapping(slot, [{ startsAt, endsAt }]) !== null;
		expect([found(0, 1000), found(2000, 3000)]).toEqual([false, false]);
		expect([found(0, 1001), found(1999, 3000), found(1200, 1300), found(0, 5000)]).toEqual([
			true,
			true,
			true,
			true
		]);
	});

	it('overlap exactly when some moment belongs to both', () => {
		const span = fc.tuple(fc.nat(30), fc.integer({ min: 1, max: 10 })).map(([at, length]) => ({
			startsAt: at,
			endsAt: at + length
		}));
		fc.assert(
			fc.property(span, span, (a, b) => {
				const shared = Array.from({ length: 41 }, (_, t) => t).some(
					(t) => a.startsAt <= t && t < a.endsAt && b.startsAt <= t && t < b.endsAt
				);
				expect(overlapping(a, [b]) !== null).toBe(shared);
			})
		);
	});
});
