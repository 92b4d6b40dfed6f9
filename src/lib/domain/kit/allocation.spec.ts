import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import planning from '../../../../tests/support/check-values/planning.json';
import { kitProblems } from '../../../../tests/support/kit-problems';
import { leastCost } from '../../../../tests/support/kit-program';
import { naiveShortages } from '../../../../tests/support/naive-kit';
import { allocate, shortages, type Allocation, type Problem } from '.';

const seeds = [20261201, Date.now()];

/** The plan as an allocation leaves it: who is left out is gone, the rest do what they are given. */
function settled(problem: Problem, { choices, ...answer }: Allocation): Problem {
	const leftOut = answer.feasible ? [] : answer.leftOut;
	const slots = problem.slots.map((slot) => ({
		...slot,
		people: slot.people
			.filter(({ id }) => !leftOut.includes(id))
			.map((person) => ({ ...person, variations: choices[slot.id]![person.id]! }))
	}));
	return { ...problem, slots };
}

type Row = { id: string; kind: string; why: string; problem: Problem };
type Expected = { expect: { feasible: boolean; moved: number; steps: number; leftOut?: number } };
const rows = (planning as unknown as (Row & Expected)[]).filter(
	({ kind }) => kind === 'allocation'
);

describe('the worked allocations of planning.json', () => {
	it.each(rows)('$id: $why', ({ problem, expect: expected }) => {
		const answer = allocate(problem);
		expect(naiveShortages(settled(problem, answer))).toEqual([]);
		if (answer.feasible) expect(answer).toMatchObject(expected);
		else expect({ feasible: false, leftOut: answer.leftOut.length }).toEqual(expected);
	});

	it('says who of v18 is left out, the last booked, and what is short with them', () => {
		const answer = allocate(rows.find(({ id }) => id === 'v18')!.problem);
		expect(answer).toMatchObject({
			feasible: false,
			leftOut: ['p4'],
			shortage: { group: 'bar-place', claimed: 3, inService: 2, short: 1, blocks: ['s1/b1'] }
		});
	});
});

describe('allocations of random plans', { timeout: 60_000 }, () => {
	const plans = kitProblems({ slots: 2, people: 5, stations: 2, rungs: 4, isEasy: true });

	it.each(seeds)('cost what an integer program says (seed %i)', (seed) => {
		fc.assert(
			fc.property(plans, (problem) => {
				const answer = allocate(problem);
				const least = leastCost(problem);
				expect(answer.feasible ? answer.moved * 1000 + answer.steps : null).toBe(least);
				expect(naiveShortages(settled(problem, answer))).toEqual([]);
			}),
			{ seed, numRuns: seed === seeds[0] ? 80 : 30, endOnFailure: true }
		);
	});

	it('move nobody where nothing is short, and somebody where something is', () => {
		fc.assert(
			fc.property(plans, (problem) => {
				const answer = allocate(problem);
				const isUntouched = answer.feasible && answer.moved === 0;
				expect(isUntouched).toBe(shortages(problem).length === 0);
				expect(allocate(problem)).toEqual(answer);
			}),
			{ seed: 7, numRuns: 60 }
		);
	});

	it('leave out as few as an integer program can', () => {
		const crowded = kitProblems({ slots: 2, people: 3, stations: 1, rungs: 2 });
		fc.assert(
			fc.property(crowded, (problem) => {
				const answer = allocate(problem);
				const count = answer.feasible ? 0 : answer.leftOut.length;
				expect(count).toBe(fewestOut(problem));
				if (!answer.feasible) expect(answer.shortage.short).toBeGreaterThan(0);
			}),
			{ seed: 11, numRuns: 12 }
		);
	});
});

/** The fewest people without whom the integer program can hold. */
function fewestOut(problem: Problem): number {
	const ids = problem.slots.flatMap(({ people }) => people.map(({ id }) => id));
	const sets = Array.from({ length: 2 ** ids.length }, (_, bits) =>
		ids.filter((_, i) => bits & (1 << i))
	).sort((x, y) => x.length - y.length);
	return sets.find((out) => {
		const slots = problem.slots.map((slot) => ({
			...slot,
			people: slot.people.filter(({ id }) => !out.includes(id))
		}));
		return leastCost({ ...problem, slots }) !== null;
	})!.length;
}
