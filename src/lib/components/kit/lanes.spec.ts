import { describe, expect, it } from 'vitest';
import { laneBars, lanePeak, laneScale, laneShorts, type Lane } from './lanes';

const rowers: Lane = {
	id: 'rower',
	name: 'Rowers',
	inService: 6,
	claims: [
		{ slotId: 'a', label: 'Finisher', from: 2400, to: 2880, count: 6, tone: 1 },
		{ slotId: 'b', label: 'Intervals', from: 2640, to: 3000, count: 5, tone: 2 }
	]
};

describe('the kit lanes', () => {
	it('stack the classes that run at once, bottom up', () => {
		expect(
			laneBars(rowers.claims).map(({ from, to, base, count }) => [from, to, base, count])
		).toEqual([
			[2400, 2640, 0, 6],
			[2640, 2880, 0, 6],
			[2640, 2880, 6, 5],
			[2880, 3000, 0, 5]
		]);
	});

	it('say where the claims pass what is there, and by how many', () => {
		expect(laneShorts(rowers)).toEqual([{ from: 2640, to: 2880, short: 5 }]);
		expect(laneShorts({ ...rowers, inService: 11 })).toEqual([]);
	});

	it('scale to 1.25 of what is there, or to the peak with a little air (DESIGN.md)', () => {
		expect(lanePeak(rowers.claims)).toBe(11);
		expect(laneScale(rowers)).toBeCloseTo(11.44);
		expect(laneScale({ ...rowers, inService: 20 })).toBe(25);
	});
});
