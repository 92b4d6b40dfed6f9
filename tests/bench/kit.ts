import { places, shortages, type Problem, type ProblemSlot } from '../../src/lib/domain/kit';
import { median } from './median';
import type { Figure } from './run';

const ladder = (group: string) => [
	{ id: `${group}-1`, needs: [{ group }] },
	{ id: `${group}-0`, needs: [] }
];

/** A plausible hour: six blocks of two or three stations, `people` who chose this and that. */
function slot(id: string, startS: number, room: string, people: number): ProblemSlot {
	const groups = ['mat', 'db', 'rower', 'kb', 'box', 'band'];
	const blocks = groups.map((group, b) => ({
		id: `b${b}`,
		startS: b * 540,
		endS: b * 540 + 500,
		rotation: b % 2 ? ('split' as const) : ('together' as const),
		waves: b === 3 ? 2 : 1,
		stations: [group, groups[(b + 2) % 6]!].map((g, s) => ({
			id: `b${b}s${s}`,
			ladder: ladder(g),
			asWritten: 0
		}))
	}));
	const range = (i: number): [number, number] => [8 + (i % 3) * 4, 12 + (i % 3) * 4];
	const person = (i: number) => ({
		id: `p${i}`,
		variations: (i % 5 === 0 ? { b2s0: 1 } : {}) as Record<string, number>,
		loads: { b1s0: { db: range(i) }, b3s0: { kb: range(i) } }
	});
	return {
		id,
		startS,
		room,
		blocks,
		people: Array.from({ length: people }, (_, i) => person(i)),
		typical: [person(1)]
	};
}

const kit: Problem['kit'] = [
	{ id: 'mat', group: 'mat', inService: 40 },
	{ id: 'rower', group: 'rower', inService: 18 },
	{ id: 'box', group: 'box', inService: 30 },
	{ id: 'band', group: 'band', inService: 36 },
	...[8, 12, 16, 20].flatMap((loadKg) => [
		{ id: `db${loadKg}`, group: 'db', inService: 20, loadKg },
		{ id: `kb${loadKg}`, group: 'kb', inService: 16, loadKg }
	])
];

function timed(rounds: number, work: () => void): number {
	const times: number[] = [];
	for (let i = 0; i < rounds; i += 1) {
		const started = performance.now();
		work();
		times.push(performance.now() - started);
	}
	return median(times);
}

export async function benchKit(): Promise<Figure[]> {
	const one: Problem = {
		kit,
		slots: [slot('a', 0, 'floor', 24), slot('b', 1200, 'loft', 9), slot('c', 2400, 'yard', 9)]
	};
	const limits = { room: 24, ratio: null, coaches: null, set: null };
	const month: Problem = {
		kit,
		slots: Array.from({ length: 200 }, (_, i) =>
			slot(
				`s${i}`,
				Math.floor(i / 2) * 4000 + (i % 2) * 1800,
				i % 2 ? 'loft' : 'floor',
				i % 2 ? 9 : 17
			)
		)
	};
	for (let i = 0; i < 500; i += 1) shortages(one);
	return [
		{
			name: "one slot's check (24 people, 6 blocks, 3 classes)",
			value: timed(201, () => shortages(one)),
			unit: 'ms',
			target: 'under 0.5'
		},
		{
			name: "one slot's places, the same",
			value: timed(51, () => places(one, { slotId: 'a', limits })),
			unit: 'ms'
		},
		{
			name: "a month's check (200 slots, two rooms)",
			value: timed(11, () => shortages(month)),
			unit: 'ms',
			target: 'under 60'
		}
	];
}
