import { describe, expect, it } from 'vitest';
import planning from '../../../../tests/support/check-values/planning.json';
import { places, refusals, shortages, type PlacesAsk, type Problem, type Shortage } from '.';

/** Worked instances of our own planning rules, each checkable by hand: planning.json. */
const rows = planning as unknown as {
	id: string;
	kind: string;
	why: string;
	problem: Problem;
	ask: PlacesAsk;
	cases: { problem: Problem; expect: { refused: { code: string }[] } }[];
	expect: { shortages: Shortage[] };
}[];
const ofKind = (kind: string) => rows.filter((row) => row.kind === kind);

describe('the worked instances of planning.json', () => {
	it.each(ofKind('shortages'))('$id: $why', ({ problem, expect: { shortages: expected } }) => {
		expect(refusals(problem)).toEqual([]);
		expect(shortages(problem)).toEqual(expected);
	});

	it.each(ofKind('places'))('$id: $why', ({ problem, ask, expect: expected }) => {
		expect(refusals(problem)).toEqual([]);
		expect(places(problem, ask)).toEqual(expected);
	});

	it.each(ofKind('refused').flatMap(({ cases }) => cases))(
		'refuses a plan: $expect.refused.0.code',
		({ problem, expect: { refused } }) => {
			expect(refusals(problem).map(({ code }) => code)).toEqual(refused.map(({ code }) => code));
		}
	);

	it('accepts every plan of the allocation rows', () => {
		expect(ofKind('allocation').flatMap(({ problem }) => refusals(problem))).toEqual([]);
	});
});
