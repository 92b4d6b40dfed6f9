import { describe, expect, it } from 'vitest';
import { coveringPass, type HeldPass } from '.';

const on = '2026-12-01';
const pass = (over: Partial<HeldPass> & { id: number }): HeldPass => ({
	kind: 'pack',
	perWeek: null,
	startsOn: '2026-11-01',
	endsOn: null,
	endedAt: null,
	balance: 5,
	usedThisWeek: 0,
	...over
});
const unlimited = (id: number, over: Partial<HeldPass> = {}) =>
	pass({ id, kind: 'membership', balance: 0, ...over });
const twoAWeek = (id: number, usedThisWeek: number) => unlimited(id, { perWeek: 2, usedThisWeek });

describe('the pass that pays', () => {
	it('is a membership while one covers the class, the unlimited first', () => {
		expect(coveringPass([pass({ id: 1 }), twoAWeek(2, 0), unlimited(3)], on)).toBe(3);
		expect(coveringPass([pass({ id: 1 }), twoAWeek(2, 1)], on)).toBe(2);
	});

	it('is a pack once the week of the membership is used up', () => {
		expect(coveringPass([twoAWeek(1, 2), pass({ id: 2 })], on)).toBe(2);
		expect(coveringPass([twoAWeek(1, 2)], on)).toBeNull();
	});

	it('is the pack that expires soonest, then the older one', () => {
		const packs = [
			pass({ id: 1 }),
			pass({ id: 2, endsOn: '2027-01-31' }),
			pass({ id: 4, endsOn: '2026-12-31' }),
			pass({ id: 3, endsOn: '2026-12-31' })
		];
		expect(coveringPass(packs, on)).toBe(3);
		expect(coveringPass([...packs].reverse(), on)).toBe(3);
		expect(coveringPass([pass({ id: 9 }), pass({ id: 8 })], on)).toBe(8);
	});

	it('is none without credits, out of date, or ended', () => {
		expect(coveringPass([pass({ id: 1, balance: 0 })], on)).toBeNull();
		expect(coveringPass([pass({ id: 1, endedAt: 1 })], on)).toBeNull();
		expect(coveringPass([unlimited(1, { endsOn: '2026-11-30' })], on)).toBeNull();
		expect(coveringPass([unlimited(1, { startsOn: '2026-12-02' })], on)).toBeNull();
		expect(coveringPass([], on)).toBeNull();
	});

	it('pays on its first and on its last day', () => {
		expect(coveringPass([unlimited(1, { startsOn: on, endsOn: on })], on)).toBe(1);
	});
});
