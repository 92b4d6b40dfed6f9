import { describe, expect, it } from 'vitest';
import { serveNewcomer, type Problem, type ProblemPerson } from '.';

/** Two bars and one place in the rings; below those the floor. Invented, checkable by hand. */
function problem(people: ProblemPerson[], floor = true): Problem {
	const ladder = [
		{ id: 'strict', needs: [{ group: 'bar' }] },
		{ id: 'rings', needs: [{ group: 'rings' }] },
		...(floor ? [{ id: 'floor', needs: [] }] : [])
	];
	return {
		kit: [
			{ id: 'k1', group: 'bar', inService: 2 },
			{ id: 'k2', group: 'rings', inService: 1 }
		],
		slots: [
			{
				id: 's',
				startS: 0,
				room: 'main',
				blocks: [
					{
						id: 'b',
						startS: 0,
						endS: 600,
						rotation: 'together',
						stations: [{ id: 'pull', ladder, asWritten: 0 }]
					}
				],
				people,
				typical: []
			}
		]
	};
}
const person = (id: string, rung?: number): ProblemPerson => ({
	id,
	variations: rung === undefined ? {} : { pull: rung }
});

describe('one more person in a class', () => {
	it('is served as chosen while the kit is there', () => {
		expect(serveNewcomer(problem([person('a')]), 's', person('n'))).toEqual({ served: true });
	});

	it('is offered the fewest steps down, not moved there', () => {
		const full = problem([person('a'), person('b')]);
		expect(serveNewcomer(full, 's', person('n'))).toEqual({ served: false, offer: { pull: 1 } });
	});

	it('goes as far down as the kit asks, past what is ruled out', () => {
		const ringsGone = problem([person('a'), person('b'), person('c', 1)]);
		expect(serveNewcomer(ringsGone, 's', person('n'))).toEqual({
			served: false,
			offer: { pull: 2 }
		});
		const noRings = { ...person('n'), cannot: ['rings'] };
		expect(serveNewcomer(problem([person('a'), person('b')]), 's', noRings)).toEqual({
			served: false,
			offer: { pull: 2 }
		});
	});

	it('is told so where nothing is left, and nobody booked is moved for them', () => {
		const full = problem([person('a'), person('b'), person('c', 1)], false);
		expect(serveNewcomer(full, 's', person('n'))).toEqual({ served: false, offer: null });
	});

	it('may join a class that is short already, of kit that they do not use', () => {
		const broken = problem([person('a'), person('b'), person('c')]);
		expect(serveNewcomer(broken, 's', person('n', 2))).toEqual({ served: true });
		expect(serveNewcomer(broken, 's', person('n'))).toEqual({ served: false, offer: { pull: 1 } });
	});
});
