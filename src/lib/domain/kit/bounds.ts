import { mostWished, type Kind, type Part, type Wish } from './kinds';
import { Pools, type Pool } from './pools';
import type { Problem } from './problem';
import { pieces } from './shortages';

/** What a part claims of a group from `lo` to `hi` kilograms. */
export type Term = { part: Part; group: string; lo: number; hi: number; peoplePerPiece: number };

/**
 * One condition of planning.md, section 2: over the rooms, what is claimed past their own
 * pieces comes to no more than the `shared` ones.
 */
export type Bound = { rooms: { own: number; terms: Term[] }[]; shared: number };

type Row = { part: Part; from: number; to: number; wishes: Map<Kind, Wish[]> };

/**
 * Every condition that some choice of these parts' people could break. An interval that
 * nobody's range ends in holds where the narrower one inside it does, so all ranges that
 * could be claimed are asked, whatever is chosen.
 */
export function boundsOf(problem: Problem, parts: Part[]): Bound[] {
	const pools = new Pools(problem.kit);
	const rows = new Map<Pool, Row[]>();
	for (const part of parts) {
		for (const [group, wishes] of wishesByGroup(part)) {
			const pool = pools.of(group, part.slot.room);
			const row = { part, from: part.from, to: part.to, wishes };
			const known = rows.get(pool);
			if (known) known.push(row);
			else rows.set(pool, [row]);
		}
	}
	return [...rows].flatMap(([pool, ofPool]) => boundsOfPool(pool, ofPool));
}

function wishesByGroup(part: Part): Map<string, Map<Kind, Wish[]>> {
	const byGroup = new Map<string, Map<Kind, Wish[]>>();
	for (const kind of part.kinds) {
		for (const wish of mostWished(kind)) {
			const ofGroup = byGroup.get(wish.group) ?? new Map<Kind, Wish[]>();
			byGroup.set(wish.group, ofGroup);
			ofGroup.set(kind, [...(ofGroup.get(kind) ?? []), wish]);
		}
	}
	return byGroup;
}

function boundsOfPool(pool: Pool, rows: Row[]): Bound[] {
	const bounds: Bound[] = [];
	let before = new Set<Row>();
	for (const { running } of pieces(rows)) {
		if (running.every((row) => before.has(row))) continue;
		before = new Set(running);
		for (const [lo, hi] of intervalsOf(pool, running)) {
			const bound = boundOf(pool, running, lo, hi);
			if (couldFail(bound, running)) bounds.push(bound);
		}
	}
	return bounds;
}

function intervalsOf(pool: Pool, running: Row[]): [number, number][] {
	const all: [number, number][] = [[-Infinity, Infinity]];
	if (!pool.hasLoads) return all;
	const ranged = running
		.flatMap(({ wishes }) => [...wishes.values()].flat())
		.filter(({ lo }) => lo !== -Infinity);
	const highs = new Set(ranged.map(({ hi }) => hi));
	for (const lo of new Set(ranged.map((wish) => wish.lo))) {
		for (const hi of highs) if (lo <= hi) all.push([lo, hi]);
	}
	return all;
}

function boundOf(pool: Pool, running: Row[], lo: number, hi: number): Bound {
	const within = pool.items.filter(
		({ loadKg }) => loadKg == null || (loadKg >= lo && loadKg <= hi)
	);
	const isShared = (room: string | null | undefined) => pool.room !== null || room == null;
	const rooms = new Map<string, { own: number; terms: Term[] }>();
	for (const { part } of running) {
		const name = part.slot.room;
		const owned = within.filter(({ room }) => !isShared(room) && room === name);
		const room = rooms.get(name) ?? { own: total(owned), terms: [] };
		rooms.set(name, room);
		const peoplePerPiece = sharingOf(part, pool.group);
		room.terms.push({ part, group: pool.group, lo, hi, peoplePerPiece });
	}
	return { rooms: [...rooms.values()], shared: total(within.filter(({ room }) => isShared(room))) };
}

const total = (items: { inService: number }[]) =>
	items.reduce((sum, { inService }) => sum + inService, 0);

/** One value in a block, or the plan is refused. */
function sharingOf(part: Part, group: string): number {
	for (const { needs } of part.stations.flatMap(({ ladder }) => ladder)) {
		for (const need of needs) if (need.group === group) return need.peoplePerPiece ?? 1;
	}
	return 1;
}

/** Whether it fails when everyone claims the most that they could. */
function couldFail(bound: Bound, running: Row[]): boolean {
	const wishes = new Map(running.map((row) => [row.part, row.wishes]));
	return (
		short(bound, (term) => {
			const sizes = term.part.kinds.flatMap(({ members }, k) => {
				const size = sizeWithin(wishes.get(term.part)!.get(term.part.kinds[k]!) ?? [], term);
				return members.map(() => size);
			});
			sizes.sort((x, y) => y - x);
			const sum = sizes.slice(0, term.part.take).reduce((s, size) => s + size, 0);
			return Math.ceil(sum / term.peoplePerPiece);
		}) > 0
	);
}

/** Pieces past what is there, given what each term claims; none or less where it holds. */
export function short(bound: Bound, claimed: (term: Term) => number): number {
	let beyond = 0;
	for (const { own, terms } of bound.rooms) {
		let inRoom = 0;
		for (const term of terms) inRoom += claimed(term);
		beyond += Math.max(0, inRoom - own);
	}
	return beyond - bound.shared;
}

/** What one person's wishes come to in a term. */
export function sizeWithin(wishes: Wish[], { group, lo, hi }: Term): number {
	let size = 0;
	for (const wish of wishes) {
		if (wish.group === group && wish.lo >= lo && wish.hi <= hi) size += wish.quantity;
	}
	return size;
}
