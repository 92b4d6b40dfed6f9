import { describe, expect, it } from 'vitest';
import { inLine, nextToServe, positionOf, waitlistMode } from '.';

const waiting = (bookingId: number, queueRank: number | null = null) => ({ bookingId, queueRank });
const line = [waiting(30), waiting(10), waiting(20)];

describe('the waitlist', () => {
	it('is first come first served, by booking', () => {
		expect(inLine(line).map((w) => w.bookingId)).toEqual([10, 20, 30]);
		expect([10, 20, 30, 40].map((id) => positionOf(line, id))).toEqual([1, 2, 3, null]);
	});

	it('puts whom staff moved to the head there', () => {
		expect(positionOf([...line, waiting(40, 0.5)], 40)).toBe(1);
		expect(positionOf([...line, waiting(40, 10)], 40)).toBe(2);
	});

	it('gives a place to the first who can be served, and says who was passed over and why', () => {
		const noBand = (w: { bookingId: number }) => (w.bookingId < 20 ? 'no band is left' : null);
		expect(nextToServe(line, noBand)).toEqual({
			next: waiting(20),
			passedOver: [{ waiting: waiting(10), why: 'no band is left' }]
		});
	});

	it('gives it to nobody where nobody can be served, and to nobody where nobody waits', () => {
		expect(nextToServe(line, () => 'kit').passedOver.map((p) => p.waiting.bookingId)).toEqual([
			10, 20, 30
		]);
		expect(nextToServe([], () => null)).toEqual({ next: null, passedOver: [] });
	});

	it('promotes until the cut-off, and lets the first who accepts have it after', () => {
		expect([1000, 1001].map((now) => waitlistMode(now, 1000))).toEqual([
			'promote',
			'first-to-accept'
		]);
	});
});
