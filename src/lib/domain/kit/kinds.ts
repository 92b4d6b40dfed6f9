import type { RangeClaim } from './claims';
import { rungOf, type ProblemPerson, type ProblemSlot, type Station } from './problem';
import { openRungs } from './regressions';

/** Pieces of a group, of one load range, that somebody wants in a part of a block. */
export type Wish = RangeClaim & { group: string };

/** A whole block that is done together, or one station of a split one; `take` largest claims count. */
export type Part = {
	slot: ProblemSlot;
	label: string;
	from: number;
	to: number;
	take: number;
	stations: Station[];
	kinds: Kind[];
};

/** People of a slot who have the same ways down in a part: `members` are their places in the booking order. */
export type Kind = { part: Part; person: ProblemPerson; members: number[]; open: number[][] };

/** One way to do a part, a rung at each station, and what it costs and wants. */
export type Way = { rungs: number[]; moved: number; steps: number; wishes: Wish[] };

/** The parts of a slot and the kinds of its people in each, in booking order. */
export function partsOf(slot: ProblemSlot): Part[] {
	return slot.blocks.flatMap((block) => {
		const isSplit = block.rotation === 'split';
		const atATime = Math.ceil(slot.people.length / (block.waves ?? 1));
		const sets = isSplit ? block.stations.map((station) => [station]) : [block.stations];
		return sets.map((stations) => {
			const part: Part = {
				slot,
				label: `${slot.id}/${block.id}`,
				from: slot.startS + block.startS,
				to: slot.startS + block.endS,
				take: Math.ceil(atATime / sets.length),
				stations,
				kinds: []
			};
			part.kinds = kindsOf(part);
			return part;
		});
	});
}

function kindsOf(part: Part): Kind[] {
	const kinds = new Map<string, Kind>();
	part.slot.people.forEach((person, i) => {
		const open = part.stations.map((station) => openRungs(station, person));
		const loads = part.stations.map(({ id }) => Object.entries(person.loads?.[id] ?? {}).sort());
		const key = JSON.stringify([open, loads]);
		const kind = kinds.get(key);
		if (kind) kind.members.push(i);
		else kinds.set(key, { part, person, members: [i], open });
	});
	return [...kinds.values()];
}

/** What a kind's people want at a station on a rung. */
export function wishesAt(kind: Kind, station: number, rung: number): Wish[] {
	const { id, ladder } = kind.part.stations[station]!;
	return ladder[rung]!.needs.map(({ group, quantity = 1 }) => {
		const range = kind.person.loads?.[id]?.[group];
		return { group, quantity, lo: range?.[0] ?? -Infinity, hi: range?.[1] ?? Infinity };
	});
}

/** The most of each group and range that one of the kind could come to claim. */
export function mostWished(kind: Kind): Wish[] {
	return kind.open.reduce<Wish[]>(
		(most, open, s) => open.reduce((soFar, rung) => once(soFar, wishesAt(kind, s, rung)), most),
		[]
	);
}

/**
 * The ways down worth trying, the choice first, then by stations moved and steps; one that costs
 * no less than another and wants no less of anything in `groups` is left out.
 */
export function waysOf(kind: Kind, groups: ReadonlySet<string>): Way[] {
	let ways: Way[] = [{ rungs: [], moved: 0, steps: 0, wishes: [] }];
	kind.open.forEach((open, s) => {
		const chosen = rungOf(kind.part.stations[s]!, kind.person);
		const longer = ways.flatMap((way) =>
			open.map((rung) => ({
				rungs: [...way.rungs, rung],
				moved: way.moved + (rung === chosen ? 0 : 1),
				steps: way.steps + rung - chosen,
				wishes: once(
					way.wishes,
					wishesAt(kind, s, rung).filter(({ group }) => groups.has(group))
				)
			}))
		);
		ways = undominated(longer);
	});
	return ways;
}

function undominated(ways: Way[]): Way[] {
	const kept: Way[] = [];
	for (const way of ways.sort((x, y) => x.moved - y.moved || x.steps - y.steps)) {
		const beaten = kept.some(
			(k) => k.moved <= way.moved && k.steps <= way.steps && wantsNoMore(k.wishes, way.wishes)
		);
		if (!beaten) kept.push(way);
	}
	return kept;
}

const isSame = (x: Wish, y: Wish) => x.group === y.group && x.lo === y.lo && x.hi === y.hi;

const wantsNoMore = (less: Wish[], more: Wish[]) =>
	less.every((wish) => more.some((m) => isSame(m, wish) && m.quantity >= wish.quantity));

/** A group and range is claimed once, at the largest quantity. */
function once(wishes: Wish[], more: Wish[]): Wish[] {
	if (more.length === 0) return wishes;
	const all = [...wishes];
	for (const wish of more) {
		const i = all.findIndex((known) => isSame(known, wish));
		if (i === -1) all.push(wish);
		else if (all[i]!.quantity < wish.quantity) all[i] = wish;
	}
	return all;
}
