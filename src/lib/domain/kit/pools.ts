import { claimedWithin, type BlockClaim } from './claims';
import type { KitItem } from './problem';

/** Pieces that can stand in for each other: a group of the site, or of one room where each has a room. */
export type Pool = {
	group: string;
	/** The room whose pool it is; null for the site's. */
	room: string | null;
	hasLoads: boolean;
	/** Whether some pieces are a room's own, which it uses first. */
	hasOwn: boolean;
	items: KitItem[];
};

/** What a pool lacks in an interval of loads, with the blocks that counted. */
export type Count = { claimed: number; inService: number; short: number; blocks: string[] };

/** The pool that a block of `room` draws a group from. Unknown groups have an empty pool. */
export class Pools {
	readonly #items = new Map<string, KitItem[]>();
	readonly #pools = new Map<string, Pool>();

	constructor(kit: readonly KitItem[]) {
		for (const item of kit) {
			const same = this.#items.get(item.group);
			if (same) same.push(item);
			else this.#items.set(item.group, [item]);
		}
	}

	of(group: string, room: string): Pool {
		const items = this.#items.get(group) ?? [];
		const housed = items.length > 0 && items.every((item) => item.room != null);
		const key = housed ? `${group}\n${room}` : group;
		let pool = this.#pools.get(key);
		if (!pool) {
			pool = {
				group,
				room: housed ? room : null,
				hasLoads: items.some((item) => item.loadKg != null),
				hasOwn: !housed && items.some((item) => item.room != null),
				items: housed ? items.filter((item) => item.room === room) : items
			};
			this.#pools.set(key, pool);
		}
		return pool;
	}
}

/** Whether the pieces from `a` to `b` kilograms are enough, without a word on what is not. */
export function isEnough(
	pool: Pool,
	running: readonly BlockClaim[],
	a: number,
	b: number
): boolean {
	if (pool.hasOwn) return countIn(pool, running, a, b).short === 0;
	let left = 0;
	for (const { loadKg, inService } of pool.items) {
		if (loadKg == null || (loadKg >= a && loadKg <= b)) left += inService;
	}
	for (const claim of running) left -= claimedWithin(claim, a, b);
	return left >= 0;
}

/**
 * Counts the claims of blocks that run at once against a pool's pieces from `a` to `b` kilograms.
 * Rooms use their own pieces first; only rooms that claim more than they own count.
 */
export function countIn(pool: Pool, running: readonly BlockClaim[], a: number, b: number): Count {
	const byRoom = new Map<string, { claimed: number; blocks: string[] }>();
	for (const claim of running) {
		const pieces = claimedWithin(claim, a, b);
		if (pieces === 0) continue;
		const room = byRoom.get(claim.room);
		if (room) {
			room.claimed += pieces;
			room.blocks.push(claim.label);
		} else byRoom.set(claim.room, { claimed: pieces, blocks: [claim.label] });
	}
	const own = new Map<string, number>();
	let inService = 0;
	for (const item of pool.items) {
		if (item.loadKg != null && (item.loadKg < a || item.loadKg > b)) continue;
		if (pool.room !== null || item.room == null) inService += item.inService;
		else own.set(item.room, (own.get(item.room) ?? 0) + item.inService);
	}
	let claimed = 0;
	const blocks = new Set<string>();
	for (const [room, wanted] of byRoom) {
		const owned = own.get(room) ?? 0;
		if (wanted.claimed <= owned) continue;
		claimed += wanted.claimed;
		inService += owned;
		for (const label of wanted.blocks) blocks.add(label);
	}
	const counted = running.flatMap(({ label }) => (blocks.has(label) ? [label] : []));
	return { claimed, inService, short: Math.max(0, claimed - inService), blocks: counted };
}
