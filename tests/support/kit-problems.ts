import fc from 'fast-check';
import type { KitItem, Need, Problem, ProblemPerson, ProblemSlot } from '../../src/lib/domain/kit';

/** How large random kit problems become. */
export type Size = {
	slots: number;
	people: number;
	stations: number;
	rungs: number;
	/** Whether kit is there for most, and most ladders end without any. */
	isEasy?: boolean;
};

const loads = [8, 12, 16, 20];
const rooms = ['loft', 'main'];

/** Bells have loads, boxes none and are shared by so many, mats are of either kind of home. */
const kitOf = (most: number): fc.Arbitrary<KitItem[]> =>
	fc
		.record({
			bellsHoused: fc.boolean(),
			bells: fc.array(
				fc.tuple(fc.constantFrom(...loads), fc.nat(most), fc.constantFrom(...rooms)),
				{
					minLength: 1,
					maxLength: 4
				}
			),
			boxes: fc.nat(2 * most),
			mats: fc.array(fc.tuple(fc.option(fc.constantFrom(...rooms)), fc.nat(most)), {
				minLength: 1,
				maxLength: 3
			})
		})
		.map(({ bellsHoused, bells, boxes, mats }) => [
			...bells.map(([loadKg, inService, room], i) => ({
				id: `bell${i}`,
				group: 'bell',
				loadKg,
				inService,
				...(bellsHoused ? { room } : {})
			})),
			{ id: 'box', group: 'box', inService: boxes },
			...mats.map(([room, inService], i) => ({
				id: `mat${i}`,
				group: 'mat',
				inService,
				...(room ? { room } : {})
			}))
		]);

function needs(boxSharing: number): fc.Arbitrary<Need[]> {
	return fc
		.record({ bell: fc.nat(2), box: fc.nat(1), mat: fc.nat(2) })
		.map(({ bell, box, mat }) => [
			...(bell ? [{ group: 'bell', quantity: bell }] : []),
			...(box ? [{ group: 'box', peoplePerPiece: boxSharing }] : []),
			...(mat ? [{ group: 'mat', quantity: mat }] : [])
		]);
}

function slotOf(id: string, size: Size): fc.Arbitrary<ProblemSlot> {
	const block = (b: number) =>
		fc.nat(3).chain((sharing) =>
			fc
				.record({
					startS: fc.nat(3),
					lengthS: fc.integer({ min: 1, max: 3 }),
					rotation: fc.constantFrom('together' as const, 'split' as const),
					waves: fc.constantFrom(1, 1, 2, 3),
					ladders: fc.array(fc.array(needs(sharing + 1), { minLength: 1, maxLength: size.rungs }), {
						minLength: 1,
						maxLength: size.stations
					})
				})
				.map(({ startS, lengthS, rotation, waves, ladders }) => ({
					id: `b${b}`,
					startS,
					endS: startS + lengthS,
					rotation,
					waves,
					stations: ladders.map((ladder, s) => ({
						id: `b${b}s${s}`,
						ladder: ladder.map((n, v) => ({
							id: `b${b}s${s}v${v}`,
							needs: size.isEasy && v > 0 && v === ladder.length - 1 ? [] : n
						})),
						asWritten: 0
					}))
				}))
		);
	const range = fc
		.tuple(fc.constantFrom(...loads), fc.constantFrom(...loads))
		.map(([a, b]): [number, number] => [Math.min(a, b), Math.max(a, b)]);
	return fc
		.tuple(block(0), fc.option(block(1)), fc.constantFrom(...rooms), fc.nat(3))
		.chain(([first, second, room, startS]) => {
			const blocks = second ? [first, second] : [first];
			const stations = blocks.flatMap((b) => b.stations);
			const person: fc.Arbitrary<ProblemPerson> = fc
				.tuple(
					fc.array(fc.tuple(fc.nat(), fc.option(range), fc.nat(5)), {
						minLength: stations.length,
						maxLength: stations.length
					})
				)
				.map(([wishes]) => {
					const chosen = stations.map((s, i) => wishes[i]![0] % (s.ladder.length + 1));
					return {
						id: '',
						variations: Object.fromEntries(
							stations.flatMap((s, i) =>
								chosen[i]! < s.ladder.length ? [[s.id, chosen[i]!] as const] : []
							)
						),
						loads: Object.fromEntries(
							stations.flatMap((s, i) => {
								const stated = wishes[i]![1];
								return stated ? [[s.id, { bell: stated }] as const] : [];
							})
						),
						cannot: stations.flatMap((s, i) => {
							const rung = chosen[i]! < s.ladder.length ? chosen[i]! : 0;
							const out = rung + wishes[i]![2] - 4;
							return wishes[i]![2] > 3 && rung + 1 < s.ladder.length && out < s.ladder.length - 1
								? [s.ladder[out]!.id]
								: [];
						})
					};
				});
			return fc
				.record({
					people: fc.array(person, { maxLength: size.people }),
					typical: fc.array(person, { maxLength: 2 })
				})
				.map(({ people, typical }) => ({
					id,
					startS,
					room,
					blocks,
					people: people.map((p, i) => ({ ...p, id: `${id}p${i}` })),
					typical: typical.map((p, i) => ({ ...p, id: `${id}t${i}` }))
				}));
		});
}

/** Accepted plans with much in them, small enough to try everything. */
export function kitProblems(size: Size): fc.Arbitrary<Problem> {
	return fc
		.tuple(
			kitOf(size.isEasy ? 5 : 2),
			...Array.from({ length: size.slots }, (_, i) => slotOf(`s${i}`, size))
		)
		.map(([items, ...slots]) => ({ kit: items, slots }));
}
