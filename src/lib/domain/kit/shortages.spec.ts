import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { kitProblems } from '../../../../tests/support/kit-problems';
import { naivePlaces, naiveShortages } from '../../../../tests/support/naive-kit';
import { places, refusals, shortages } from '.';

const plans = kitProblems({ slots: 2, people: 5, stations: 2, rungs: 3 });
const seeds = [20261201, Date.now()];

describe('random plans, against a plain reading of planning.md', { timeout: 60_000 }, () => {
	it.each(seeds)('are short where they are said to be (seed %i)', (seed) => {
		fc.assert(
			fc.property(plans, (problem) => {
				expect(refusals(problem)).toEqual([]);
				expect(shortages(problem)).toEqual(naiveShortages(problem));
			}),
			{ seed, numRuns: 500 }
		);
	});

	it('are told from plans in which shared pieces are rounded down', () => {
		expect(() =>
			fc.assert(
				fc.property(plans, (problem) => {
					expect(shortages(problem)).toEqual(naiveShortages(problem, undefined, Math.floor));
				}),
				{ seed: 1, numRuns: 300 }
			)
		).toThrow(/Property failed/);
	});

	const small = kitProblems({ slots: 2, people: 2, stations: 2, rungs: 2 });
	it.each(seeds)('have the places that trying everything finds (seed %i)', (seed) => {
		fc.assert(
			fc.property(small, fc.nat(4), fc.nat(2), (problem, room, booked) => {
				const limits = { room, ratio: 2, coaches: 2, set: null };
				const ask = { slotId: 's0', booked, limits };
				expect(places(problem, ask)).toMatchObject(naivePlaces(problem, ask));
			}),
			{ seed, numRuns: 60 }
		);
	});
});
