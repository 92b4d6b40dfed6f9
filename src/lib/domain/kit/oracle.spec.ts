import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
	places,
	refusals,
	shortages,
	type Problem,
	type ProblemPerson,
	type ProblemSlot,
	type Variation
} from '.';

/**
 * A second reading of planning.md, section 2 and 4, written from its words and as slowly as they
 * are: largest claims by trying every set of people, time second by second, regressions by trying
 * every choice of everybody. It shares no code with the rules.
 */
type Range = [number, number];

const subsets = <T>(items: T[], size: number): T[][] =>
	size === 0
		? [[]]
		: items.flatMap((item, i) =>
				subsets(items.slice(i + 1), size - 1).map((rest) => [item, ...rest])
			);

function rung(station: Problem['slots'][0]['blocks'][0]['stations'][0], person: ProblemPerson) {
	let at = person.variations?.[station.id] ?? station.asWritten;
	while (person.cannot?.includes(station.ladder[at]!.id)) at += 1;
	return station.ladder[at]!;
}

const inside = (range: Range | undefined, [a, b]: Range) =>
	a === -Infinity ? true : range !== undefined && range[0] >= a && range[1] <= b;

/** Pieces of a group that one block claims of an interval. */
function claim(
	block: ProblemSlot['blocks'][0],
	people: ProblemPerson[],
	group: string,
	interval: Range
): number {
	const atATime = Math.ceil(people.length / (block.waves ?? 1));
	const sharing =
		block.stations.flatMap((s) => s.ladder.flatMap((v) => v.needs)).find((n) => n.group === group)
			?.peoplePerPiece ?? 1;
	const needOf = (person: ProblemPerson, s: (typeof block.stations)[0]) =>
		rung(s, person).needs.find((n) => n.group === group);
	const rangeOf = (person: ProblemPerson, s: (typeof block.stations)[0]) =>
		person.loads?.[s.id]?.[group];
	const most = (size: number, claimOf: (person: ProblemPerson) => number) =>
		Math.ceil(
			Math.max(
				0,
				...subsets(people, Math.min(size, people.length)).map((set) =>
					set.reduce((n, p) => n + claimOf(p), 0)
				)
			) / sharing
		);
	if (block.rotation === 'split') {
		const each = Math.ceil(atATime / block.stations.length);
		return block.stations.reduce(
			(sum, s) =>
				sum +
				most(each, (p) =>
					needOf(p, s) && inside(rangeOf(p, s), interval) ? (needOf(p, s)!.quantity ?? 1) : 0
				),
			0
		);
	}
	return most(atATime, (person) => {
		const byRange = new Map<string, number>();
		for (const s of block.stations) {
			const need = needOf(person, s);
			if (!need || !inside(rangeOf(person, s), interval)) continue;
			const key = String(rangeOf(person, s));
			byRange.set(key, Math.max(byRange.get(key) ?? 0, need.quantity ?? 1));
		}
		return [...byRange.values()].reduce((a, b) => a + b, 0);
	});
}

/** How short each pool and interval is at each second: "group|room|a,b|second" -> pieces. */
function shortBySecond({ kit, slots }: Problem, intervals: Range[]): Map<string, number> {
	const found = new Map<string, number>();
	const rooms = [...new Set(slots.map(({ room }) => room))];
	for (const group of new Set(kit.map((item) => item.group))) {
		const items = kit.filter((item) => item.group === group);
		const housed = items.every((item) => item.room != null);
		const loaded = items.some((item) => item.loadKg != null);
		const pools = housed ? rooms.map((room) => [room]) : [rooms];
		for (const pool of pools) {
			for (const interval of loaded ? intervals : ([[-Infinity, Infinity]] as Range[])) {
				const fits = (kg?: number | null) => kg == null || (kg >= interval[0] && kg <= interval[1]);
				const pieces = (room: string | null) =>
					items
						.filter((i) => (i.room ?? null) === room && fits(i.loadKg))
						.reduce((n, i) => n + i.inService, 0);
				for (let second = 0; second < 8; second += 1) {
					let over = 0;
					for (const room of pool) {
						const claimed = slots
							.filter((s) => s.room === room)
							.flatMap((s) =>
								s.blocks
									.filter((b) => s.startS + b.startS <= second && second < s.startS + b.endS)
									.map((b) => claim(b, s.people, group, interval))
							)
							.reduce((a, b) => a + b, 0);
						over += Math.max(0, claimed - pieces(room));
					}
					const short = over - (housed ? 0 : pieces(null));
					if (short > 0)
						found.set(`${group}|${housed ? pool[0] : null}|${interval}|${second}`, short);
				}
			}
		}
	}
	return found;
}

const kg = [8, 12, 16];
const intervalsOf: Range[] = [
	[-Infinity, Infinity],
	...kg.flatMap((a) => kg.filter((b) => b >= a).map((b): Range => [a, b]))
];

const need = fc.constantFrom<Variation['needs'][]>(
	[],
	[{ group: 'bell' }],
	[{ group: 'bell', quantity: 2 }],
	[{ group: 'box' }],
	[{ group: 'bar' }],
	[{ group: 'bar' }, { group: 'box' }]
);
const arbitraryProblem = fc
	.record({
		needs: fc.array(fc.array(need, { minLength: 1, maxLength: 3 }), { minLength: 4, maxLength: 4 }),
		rotation: fc.array(fc.constantFrom('together' as const, 'split' as const), {
			minLength: 2,
			maxLength: 2
		}),
		waves: fc.integer({ min: 1, max: 3 }),
		people: fc.array(
			fc.record({ pick: fc.nat(2), low: fc.nat(2), high: fc.nat(2), states: fc.boolean() }),
			{ minLength: 0, maxLength: 4 }
		),
		others: fc.integer({ min: 0, max: 3 }),
		shift: fc.integer({ min: 0, max: 3 }),
		pieces: fc.array(fc.integer({ min: 0, max: 3 }), { minLength: 7, maxLength: 7 })
	})
	.map(({ needs, rotation, waves, people, others, shift, pieces }): Problem => {
		const stationsOf = (slot: string) =>
			[0, 1, 2, 3].map((i) => ({
				id: `${slot}s${i}`,
				ladder: needs[i]!.map((n, v) => ({ id: `${slot}s${i}v${v}`, needs: n })),
				asWritten: 0
			}));
		const blocksOf = (slot: string) => {
			const s = stationsOf(slot);
			return [
				{ id: 'b0', startS: 0, endS: 2, rotation: rotation[0]!, waves, stations: s.slice(0, 2) },
				{ id: 'b1', startS: 2, endS: 4, rotation: rotation[1]!, waves: 1, stations: s.slice(2) }
			];
		};
		const person = (
			slot: string,
			{ pick, low, high, states }: (typeof people)[0],
			i: number
		): ProblemPerson => {
			const range: Range = [kg[Math.min(low, high)]!, kg[Math.max(low, high)]!];
			return {
				id: `${slot}p${i}`,
				variations: { [`${slot}s0`]: Math.min(pick, needs[0]!.length - 1) },
				loads: states
					? Object.fromEntries([0, 1, 2].map((n) => [`${slot}s${n}`, { bell: range }]))
					: {}
			};
		};
		const asWritten = { low: 0, high: 1, pick: 0, states: true };
		return {
			kit: [
				{ id: 'k0', group: 'bell', loadKg: 8, inService: pieces[0]! },
				{ id: 'k1', group: 'bell', loadKg: 12, inService: pieces[1]! },
				{ id: 'k2', group: 'bell', loadKg: 16, inService: pieces[2]! },
				{ id: 'k3', group: 'box', room: 'main', inService: pieces[3]! },
				{ id: 'k4', group: 'box', inService: pieces[4]! },
				{ id: 'k5', group: 'bar', room: 'main', inService: pieces[5]! },
				{ id: 'k6', group: 'bar', room: 'loft', inService: pieces[6]! }
			],
			slots: [
				{
					id: 'x',
					startS: 0,
					room: 'main',
					blocks: blocksOf('x'),
					people: people.map((p, i) => person('x', p, i)),
					typical: [person('x', asWritten, 90)]
				},
				{
					id: 'y',
					startS: shift,
					room: 'loft',
					blocks: blocksOf('y'),
					people: Array.from({ length: others }, (_, i) => person('y', asWritten, i)),
					typical: []
				}
			]
		};
	});

const fresh = { numRuns: 100 };
const fixed = { numRuns: 200, seed: 20261201 };

describe('the kit rules against a second, slower reading', () => {
	it.each([
		['a fixed seed', fixed],
		['a fresh seed', fresh]
	])(
		'find the same shortages (%s)',
		(_, run) => {
			fc.assert(
				fc.property(arbitraryProblem, (problem) => {
					expect(refusals(problem)).toEqual([]);
					const slow = shortBySecond(problem, intervalsOf);
					const quick = shortages(problem);
					for (const s of quick) {
						const interval = s.interval ?? [-Infinity, Infinity];
						for (let second = s.from; second < s.to; second += 1) {
							expect(slow.get(`${s.group}|${s.room}|${interval}|${second}`)).toBe(s.short);
						}
					}
					const seconds = (group: string) =>
						new Set(
							[...slow.keys()].filter((k) => k.startsWith(group)).map((k) => k.split('|')[3])
						);
					for (const group of ['bell', 'box', 'bar']) {
						const said = new Set(
							quick
								.filter((s) => s.group === group)
								.flatMap((s) =>
									Array.from({ length: s.to - s.from }, (__, i) => String(s.from + i))
								)
						);
						expect([...said].sort()).toEqual([...seconds(group)].sort());
					}
				}),
				run
			);
		},
		60_000
	);

	it.each([
		['a fixed seed', { ...fixed, numRuns: 60 }],
		['a fresh seed', { ...fresh, numRuns: 30 }]
	])(
		'count the same places (%s)',
		(_, run) => {
			fc.assert(
				fc.property(arbitraryProblem, (problem) => {
					const slot = problem.slots[0]!;
					const booked = slot.people.length;
					const most = Math.min(booked + 2, 5);
					const withPeople = (people: ProblemPerson[]): Problem => ({
						...problem,
						slots: [{ ...slot, people }, problem.slots[1]!]
					});
					const without = shortBySecond(withPeople([]), intervalsOf);
					const serves = (people: ProblemPerson[]) =>
						[...shortBySecond(withPeople(people), intervalsOf)].every(
							([key, short]) => short <= (without.get(key) ?? 0)
						);
					const first = (n: number) =>
						Array.from({ length: n }, (__, i) => (i < booked ? slot.people[i]! : slot.typical[0]!));
					const ways = (person: ProblemPerson): ProblemPerson[] =>
						slot.blocks
							.flatMap((b) => b.stations)
							.reduce<ProblemPerson[]>(
								(all, s) =>
									all.flatMap((p) =>
										s.ladder.map((__, v) => ({ ...p, variations: { ...p.variations, [s.id]: v } }))
									),
								[person]
							);
					const movable = (n: number) => {
						const fixedPeople = first(Math.min(n, booked));
						const options = n > booked ? ways(slot.typical[0]!) : [];
						const tries =
							n - booked <= 0
								? [[]]
								: n - booked === 1
									? options.map((o) => [o])
									: options.flatMap((a, i) => options.slice(i).map((b) => [a, b]));
						return tries.some((extra) => serves([...fixedPeople, ...extra]));
					};
					const largest = (fits: (n: number) => boolean) => {
						let n = 0;
						while (n < most && fits(n + 1)) n += 1;
						return n;
					};
					const answer = places(problem, {
						slotId: 'x',
						limits: { room: most, ratio: null, coaches: null, set: null }
					});
					expect(answer.asWritten).toBe(largest((n) => serves(first(n))));
					expect(answer.withRegressions).toBe(largest(movable));
				}),
				run
			);
		},
		60_000
	);
});
