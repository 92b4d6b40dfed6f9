import { short, sizeWithin, type Bound, type Term } from './bounds';
import { waysOf, type Kind, type Way } from './kinds';

/** How many of a kind go each way; the rest, and the earliest booked, stay as chosen. */
export type Going = { kind: Kind; ways: Way[]; counts: number[] };
export type Relief = { moved: number; steps: number; going: Going[] };

/** People by the size of what they claim in a term; largest first. */
type Tally = { sizes: number[]; counts: number[]; take: number; perPiece: number };
type Mover = { ways: Way[]; people: number; tallies: { tally: Tally; places: number[] }[] };
/** What one move, at the best, takes off a bound, and what all of a mover's people can. */
type Reducer = {
	mover: number;
	people: number;
	perMove: number;
	perPerson: number;
};
type Level = { mover: number; way: number };

/**
 * The fewest stations moved, then the fewest steps, by which kinds of people meet bounds that
 * bear on them; `null` where no ways do. Exact: branch and bound over how many of a kind
 * go each way, for one move, two, and so on. A branch ends where the people left to decide,
 * with the moves left, cannot take enough off some bound; and where the same tallies
 * were reached before as cheaply.
 */
export function relieve(kinds: Kind[], bounds: Bound[], isEnough = false): Relief | null {
	const groups = new Set(
		bounds.flatMap(({ rooms }) => rooms.flatMap((r) => r.terms)).map((t) => t.group)
	);
	const terms = [...new Set(bounds.flatMap(({ rooms }) => rooms.flatMap((room) => room.terms)))];
	const tallies = new Map<Term, Tally>();
	const waysBy = kinds.map((kind) => waysOf(kind, groups));
	for (const term of terms) tallies.set(term, tallyOf(term, kinds, waysBy));
	const movers = kinds.map((kind, k): Mover => {
		const ofKind = terms.filter(({ part }) => part === kind.part);
		return {
			ways: waysBy[k]!,
			people: kind.members.length,
			tallies: ofKind.map((term) => {
				const tally = tallies.get(term)!;
				const places = waysBy[k]!.map((way) => tally.sizes.indexOf(sizeWithin(way.wishes, term)));
				return { tally, places };
			})
		};
	});
	for (const { people, tallies: own } of movers) {
		for (const { tally, places } of own) tally.counts[places[0]!]! += people;
	}
	const reducers = bounds.map((bound) => reducersOf(bound, kinds, waysBy));
	const levels = movers.flatMap(({ ways }, mover): Level[] =>
		ways.slice(1).map((_, way) => ({ mover, way: way + 1 }))
	);
	const all = [...tallies.values()];
	const most = movers.reduce(
		(sum, m) => sum + m.people * Math.max(...m.ways.map((w) => w.moved)),
		0
	);

	const used = levels.map(() => 0);
	let best: { steps: number; used: number[] } | null = null;
	let reached = new Map<string, number>();

	const isOpen = fits(most, 0, freeAt(0)) && attempt(most, true);
	if (!isOpen) return null;
	let moved = most;
	if (!isEnough) for (moved = 0; !attempt(moved, false);) moved += 1;
	return outcome();

	/** Looks for ways with so many moves; for any at all, or for the fewest steps. */
	function attempt(moves: number, isAny: boolean): boolean {
		best = null;
		reached = new Map();
		descend(0, freeAt(0), moves, 0, isAny);
		return best !== null;
	}

	function descend(i: number, free: number, moves: number, steps: number, isAny: boolean): void {
		if (best && (isAny || steps >= best.steps)) return;
		if (!fits(moves, i, free)) return;
		const level = levels[i];
		if (!level) {
			best = { steps, used: [...used] };
			return;
		}
		const key = `${i}|${free}|${moves}|${all.map(({ counts }) => counts.join()).join(';')}`;
		const before = reached.get(key);
		if (before !== undefined && (isAny || before <= steps)) return;
		reached.set(key, steps);
		const mover = movers[level.mover]!;
		const way = mover.ways[level.way]!;
		const can = Math.min(free, Math.floor(moves / way.moved));
		for (let n = 0; n <= can; n += 1) {
			const count = isAny ? can - n : n;
			shift(mover, level.way, count);
			used[i] = count;
			const next = levels[i + 1];
			const left = next?.mover === level.mover ? free - count : freeAt(i + 1);
			descend(i + 1, left, moves - count * way.moved, steps + count * way.steps, isAny);
			shift(mover, level.way, -count);
		}
		used[i] = 0;
	}

	function freeAt(i: number): number {
		const level = levels[i];
		return level ? movers[level.mover]!.people : 0;
	}

	function shift(mover: Mover, way: number, count: number): void {
		for (const { tally, places } of mover.tallies) {
			tally.counts[places[0]!]! -= count;
			tally.counts[places[way]!]! += count;
		}
	}

	/** Whether those from level `i` on could still meet every bound. */
	function fits(moves: number, i: number, free: number): boolean {
		return bounds.every((bound, b) => {
			const now = short(bound, (term) => claimed(tallies.get(term)!));
			if (now <= 0) return true;
			const atBest = reduction(reducers[b]!, moves, levels[i]?.mover ?? movers.length, free);
			if (atBest === 0) return false;
			return short(bound, (term) => largest(tallies.get(term)!)) <= atBest + 1e-9;
		});
	}

	function outcome(): Relief {
		const going = kinds.map((kind, k) => {
			const counts = waysBy[k]!.map(() => 0);
			levels.forEach(({ mover, way }, i) => {
				if (mover === k) counts[way] = best!.used[i]!;
			});
			return { kind, ways: waysBy[k]!, counts };
		});
		return { moved, steps: best!.steps, going };
	}
}

function tallyOf(term: Term, kinds: Kind[], ways: Way[][]): Tally {
	const sizes = kinds.flatMap(({ part }, k) =>
		part === term.part ? ways[k]!.map(({ wishes }) => sizeWithin(wishes, term)) : []
	);
	const distinct = [...new Set(sizes)].sort((x, y) => y - x);
	const { take } = term.part;
	return { sizes: distinct, counts: distinct.map(() => 0), take, perPiece: term.peoplePerPiece };
}

/** The `take` largest claims of a term, in pieces; not yet rounded up. */
function largest({ sizes, counts, take, perPiece }: Tally): number {
	let left = take;
	let sum = 0;
	for (let i = 0; i < sizes.length && left > 0; i += 1) {
		const counted = Math.min(left, counts[i]!);
		sum += counted * sizes[i]!;
		left -= counted;
	}
	return sum / perPiece;
}

const claimed = (tally: Tally) => Math.ceil(largest(tally));

/** No change of one claim changes the sum of the largest by more than itself. */
function reducersOf(bound: Bound, kinds: Kind[], ways: Way[][]): Reducer[] {
	const terms = bound.rooms.flatMap((room) => room.terms);
	const reducers = kinds.flatMap(({ part, members }, mover): Reducer[] => {
		const own = terms.filter((term) => term.part === part);
		const size = (way: Way, term: Term) => sizeWithin(way.wishes, term) / term.peoplePerPiece;
		const [chosen, ...down] = ways[mover]!;
		let [perMove, perPerson] = [0, 0];
		for (const way of down) {
			let off = 0;
			for (const term of own) off += Math.max(0, size(chosen!, term) - size(way, term));
			perMove = Math.max(perMove, off / way.moved);
			perPerson = Math.max(perPerson, off);
		}
		return perMove > 0 ? [{ mover, people: members.length, perMove, perPerson }] : [];
	});
	return reducers.sort((x, y) => y.perMove - x.perMove);
}

/** The most that the movers from `current` on, `free` people of it, take off with so many moves. */
function reduction(reducers: Reducer[], moves: number, current: number, free: number): number {
	let left = moves;
	let off = 0;
	for (const { mover, people, perMove, perPerson } of reducers) {
		if (mover < current) continue;
		const who = mover === current ? free : people;
		const spent = Math.min(left, (who * perPerson) / perMove);
		off += spent * perMove;
		left -= spent;
		if (left <= 0) break;
	}
	return off;
}
