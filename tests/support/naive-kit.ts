import type {
	PlacesAsk,
	Problem,
	ProblemBlock,
	ProblemPerson,
	ProblemSlot,
	Shortage,
	Station
} from '../../src/lib/domain/kit';

/**
 * Planning.md, sections 2 to 4, once more and as plainly as can be: second by second, person by
 * person, trying everything. Shares no code with the rules, and holds them to their words.
 */
export type Rung = (station: Station, person: ProblemPerson) => number;
type Claim = { range: [number, number]; quantity: number };
type Failing = { a: number; b: number } & Pick<
	Shortage,
	'claimed' | 'inService' | 'short' | 'blocks'
>;
type Moment = { group: string; room: string | null; failing: Failing[] };

export const naiveRung: Rung = (station, person) => {
	let rung = person.variations?.[station.id] ?? station.asWritten;
	while (person.cannot?.includes(station.ladder[rung]!.id)) rung += 1;
	return rung;
};

function claimsAt(station: Station, person: ProblemPerson, group: string, rung: Rung): Claim[] {
	return station.ladder[rung(station, person)]!.needs.filter((n) => n.group === group).map((n) => ({
		range: person.loads?.[station.id]?.[group] ?? [-Infinity, Infinity],
		quantity: n.quantity ?? 1
	}));
}

const inside = ({ range }: Claim, a: number, b: number) => range[0] >= a && range[1] <= b;
const sum = (numbers: number[]) => numbers.reduce((total, n) => total + n, 0);

/** `together`: one group and range once, at the largest quantity; different ranges add up. */
function onceTogether(claims: Claim[]): Claim[] {
	const keys = [...new Set(claims.map(({ range }) => range.join()))];
	return keys.map((key) => {
		const same = claims.filter(({ range }) => range.join() === key);
		return {
			range: same[0]!.range,
			quantity: Math.max(...same.map(({ quantity }) => quantity))
		};
	});
}

/** Each part's people's claims, a whole block or one station of a split one. */
function partsOf(block: ProblemBlock, people: ProblemPerson[], group: string, rung: Rung) {
	if (block.rotation === 'split')
		return block.stations.map((s) => people.map((p) => claimsAt(s, p, group, rung)));
	return [
		people.map((p) => onceTogether(block.stations.flatMap((s) => claimsAt(s, p, group, rung))))
	];
}

export function naiveBlockClaim(
	block: ProblemBlock,
	people: ProblemPerson[],
	group: string,
	[a, b]: [number, number],
	rung: Rung = naiveRung,
	roundUp = Math.ceil
): number {
	const c = Math.ceil(people.length / (block.waves ?? 1));
	const atEach = block.rotation === 'split' ? Math.ceil(c / block.stations.length) : c;
	const needs = block.stations.flatMap((s) => s.ladder.flatMap((v) => v.needs));
	const perPiece = needs.find((n) => n.group === group)?.peoplePerPiece ?? 1;
	const parts = partsOf(block, people, group, rung).map((personal) => {
		const sizes = personal.map((claims) =>
			sum(claims.filter((claim) => inside(claim, a, b)).map(({ quantity }) => quantity))
		);
		return sum(sizes.sort((x, y) => y - x).slice(0, atEach));
	});
	return sum(parts.map((part) => roundUp(part / perPiece)));
}

/** What each pool lacks at one second, in every interval asked for. */
function at(problem: Problem, t: number, rung: Rung, roundUp: (n: number) => number): Moment[] {
	const groups = [...new Set(problem.kit.map(({ group }) => group))];
	return groups.flatMap((group) => {
		const items = problem.kit.filter((item) => item.group === group);
		const housed = items.every((item) => item.room != null);
		const rooms = housed ? [...new Set(problem.slots.map(({ room }) => room))] : [null];
		return rooms.map((room) => {
			const running = problem.slots
				.filter((slot) => room === null || slot.room === room)
				.flatMap((slot) => slot.blocks.map((block) => ({ slot, block })))
				.filter(
					({ slot, block }) => slot.startS + block.startS <= t && t < slot.startS + block.endS
				);
			const ranges = running.flatMap(({ slot, block }) =>
				slot.people.flatMap((p) =>
					block.stations.flatMap((s) => claimsAt(s, p, group, rung).map(({ range }) => range))
				)
			);
			const ends = ranges.filter(([low]) => low !== -Infinity);
			const intervals: [number, number][] = [[-Infinity, Infinity]];
			if (items.some(({ loadKg }) => loadKg != null)) {
				for (const [a] of ends) for (const [, b] of ends) if (a <= b) intervals.push([a, b]);
			}
			const unique = [...new Map(intervals.map((i) => [i.join(), i])).values()];
			const failing = unique.map(([a, b]) => {
				const within = items.filter(({ loadKg }) => loadKg == null || (loadKg >= a && loadKg <= b));
				const pieces = (of: string | null) =>
					sum(
						within.filter((item) => (item.room ?? null) === of).map(({ inService }) => inService)
					);
				const blocks = running.map(({ slot, block }) => ({
					name: `${slot.id}/${block.id}`,
					room: slot.room,
					claimed: naiveBlockClaim(block, slot.people, group, [a, b], rung, roundUp)
				}));
				const claimedIn = (of: string) =>
					sum(blocks.filter((x) => x.room === of).map(({ claimed }) => claimed));
				const counting = [...new Set(blocks.map((x) => x.room))].filter(
					(of) => claimedIn(of) > (room === null ? pieces(of) : 0)
				);
				const claimed = sum(counting.map(claimedIn));
				const inService = room === null ? sum(counting.map(pieces)) + pieces(null) : pieces(room);
				return {
					a,
					b,
					claimed,
					inService,
					short: claimed - inService,
					blocks: blocks
						.filter((x) => x.claimed > 0 && counting.includes(x.room))
						.map(({ name }) => name)
				};
			});
			return { group, room, failing };
		});
	});
}

const width = ({ a, b }: Failing) => (a === -Infinity ? Infinity : b - a);

function report(failing: Failing[]): Failing[] {
	const ranked = failing
		.filter(({ short }) => short > 0)
		.sort((x, y) => {
			if (x.short !== y.short) return y.short - x.short;
			return width(x) === width(y) ? x.a - y.a : width(x) - width(y);
		});
	const kept: Failing[] = [];
	for (const f of ranked) if (kept.every((k) => k.b < f.a || f.b < k.a)) kept.push(f);
	return kept;
}

const secondsOf = (problem: Problem): number[] => {
	const ends = problem.slots.flatMap((s) => s.blocks.map((b) => s.startS + b.endS));
	const starts = problem.slots.flatMap((s) => s.blocks.map((b) => s.startS + b.startS));
	const first = Math.min(0, ...starts);
	return Array.from({ length: Math.max(0, ...ends) - first }, (_, i) => first + i);
};

export function naiveShortages(
	problem: Problem,
	rung: Rung = naiveRung,
	roundUp = Math.ceil
): Shortage[] {
	const found: Shortage[] = [];
	for (const t of secondsOf(problem)) {
		for (const { group, room, failing } of at(problem, t, rung, roundUp)) {
			for (const { a, b, claimed, inService, short, blocks } of report(failing)) {
				const interval: [number, number] | null = a === -Infinity ? null : [a, b];
				const same = { group, room, interval, claimed, inService, short, blocks };
				const before = found.find(({ from, to, ...rest }) => {
					return to === t && from < t && JSON.stringify(rest) === JSON.stringify(same);
				});
				if (before) before.to = t + 1;
				else found.push({ ...same, from: t, to: t + 1 });
			}
		}
	}
	const text = (x: string | null, y: string | null) =>
		x === y ? 0 : x === null || (y !== null && x < y) ? -1 : 1;
	return found.sort(
		(x, y) =>
			x.from - y.from ||
			text(x.group, y.group) ||
			text(x.room, y.room) ||
			(x.interval ? x.interval[0] : -1e9) - (y.interval ? y.interval[0] : -1e9)
	);
}

/** Whether the slot with these people is short anywhere by more than the same slot with nobody. */
function makesWorse(problem: Problem, slotId: string, people: ProblemPerson[]): boolean {
	const put = (who: ProblemPerson[]): Problem => ({
		...problem,
		slots: problem.slots.map((s) => (s.id === slotId ? { ...s, people: who } : s))
	});
	const withThem = put(people);
	const without = put([]);
	return secondsOf(problem).some((t) => {
		const before = at(without, t, naiveRung, Math.ceil);
		return at(withThem, t, naiveRung, Math.ceil).some(({ group, room, failing }) =>
			failing.some(({ a, b, short }) => {
				if (short <= 0) return false;
				const pool = before.find((m) => m.group === group && m.room === room)!;
				const same = pool.failing.find((f) => f.a === a && f.b === b);
				return short > Math.max(0, same ? same.short : shortIn(without, t, group, room, a, b));
			})
		);
	});
}

/** An interval that nobody's range ends in any more, asked by a person of no weight. */
function shortIn(
	problem: Problem,
	t: number,
	group: string,
	room: string | null,
	a: number,
	b: number
): number {
	const items = problem.kit.filter(
		(i) =>
			i.group === group &&
			(room === null || i.room === room) &&
			(i.loadKg == null || (i.loadKg >= a && i.loadKg <= b))
	);
	const claimed = sum(
		problem.slots
			.filter((s) => room === null || s.room === room)
			.flatMap((s) =>
				s.blocks
					.filter((k) => s.startS + k.startS <= t && t < s.startS + k.endS)
					.map((k) => naiveBlockClaim(k, s.people, group, [a, b]))
			)
	);
	return claimed - sum(items.map(({ inService }) => inService));
}

/** Every way down for a person, one choice for each station of the slot. */
export function* waysDown(slot: ProblemSlot, person: ProblemPerson): Generator<ProblemPerson> {
	const stations = slot.blocks.flatMap(({ stations }) => stations);
	function* from(i: number, variations: Record<string, number>): Generator<ProblemPerson> {
		const station = stations[i];
		if (!station) {
			yield { ...person, variations };
			return;
		}
		for (let r = naiveRung(station, person); r < station.ladder.length; r += 1) {
			if (person.cannot?.includes(station.ladder[r]!.id)) continue;
			yield* from(i + 1, { ...variations, [station.id]: r });
		}
	}
	yield* from(0, {});
}

export function* everyWay(slot: ProblemSlot, people: ProblemPerson[]): Generator<ProblemPerson[]> {
	const [first, ...rest] = people;
	if (!first) {
		yield [];
		return;
	}
	for (const moved of waysDown(slot, first))
		for (const others of everyWay(slot, rest)) yield [moved, ...others];
}

export function naivePlaces(problem: Problem, ask: PlacesAsk) {
	const slot = problem.slots.find(({ id }) => id === ask.slotId)!;
	const { room, ratio, coaches, set } = ask.limits;
	const limits = [
		['room', room] as const,
		['coach', ratio === null || coaches === null ? null : ratio * coaches] as const,
		['set', set] as const
	].flatMap(([by, limit]) => (limit === null ? [] : [{ by, limit }]));
	const most = Math.min(...limits.map(({ limit }) => limit));
	const booked = slot.people.slice(0, ask.booked ?? slot.people.length);
	const typical = slot.typical.length > 0 ? slot.typical : [{ id: 'w' }];
	const newcomers = (n: number) =>
		Array.from({ length: Math.max(0, n - booked.length) }, (_, i) => typical[i % typical.length]!);
	let asWritten = 0;
	for (let n = 1; n <= most; n += 1) {
		if (!makesWorse(problem, slot.id, [...booked.slice(0, n), ...newcomers(n)])) asWritten = n;
	}
	let withRegressions = 0;
	for (let n = 1; n <= most; n += 1) {
		for (const moved of everyWay(slot, newcomers(n))) {
			if (makesWorse(problem, slot.id, [...booked.slice(0, n), ...moved])) continue;
			withRegressions = n;
			break;
		}
	}
	const limit = Math.min(most, asWritten);
	const limitedBy = limits.find((l) => l.limit === limit)?.by ?? 'kit';
	return { asWritten, withRegressions, limit, limitedBy };
}
