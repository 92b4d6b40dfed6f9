import { claimsByGroup, type BlockClaim } from './claims';
import { countIn, isEnough, Pools, type Count, type Pool } from './pools';
import type { Problem, Shortage } from './problem';

/** An interval of loads in which a pool falls short; infinite bounds are the whole pool. */
export type Failure = Count & { a: number; b: number };

/**
 * Where the plan's people want more pieces than are in service: planning.md, section 2.
 * Ask `refusals` first; of a refused plan the answer means nothing.
 * @returns ordered by `from`, group, room, interval; empty where the kit serves everyone
 */
export function shortages(problem: Problem): Shortage[] {
	const pools = new Pools(problem.kit);
	const found: Shortage[] = [];
	for (const [group, claims] of claimsByGroup(problem)) {
		for (const [pool, ofPool] of byPool(pools, group, claims)) {
			found.push(...shortagesOf(pool, ofPool, failures));
		}
	}
	return inOrder(found);
}

/** Splits the claims of a group among the pools that they draw from. */
export function byPool(pools: Pools, group: string, claims: BlockClaim[]): Map<Pool, BlockClaim[]> {
	const split = new Map<Pool, BlockClaim[]>();
	for (const claim of claims) {
		const pool = pools.of(group, claim.room);
		const known = split.get(pool);
		if (known) known.push(claim);
		else split.set(pool, [claim]);
	}
	return split;
}

/** Cuts the clock at every edge of a pool's blocks and joins equal shortages of successive pieces. */
export function shortagesOf(
	pool: Pool,
	claims: BlockClaim[],
	find: (pool: Pool, running: BlockClaim[]) => Failure[]
): Shortage[] {
	const found: Shortage[] = [];
	let open = new Map<string, Shortage>();
	for (const { from, to, running } of pieces(claims)) {
		const next = new Map<string, Shortage>();
		for (const failure of reported(find(pool, running))) {
			const { claimed, inService, short, blocks } = failure;
			const interval: [number, number] | null =
				failure.a === -Infinity ? null : [failure.a, failure.b];
			const key = `${interval}|${claimed}|${inService}|${blocks}`;
			const before = open.get(key);
			if (before && before.to === from) {
				before.to = to;
				next.set(key, before);
				continue;
			}
			const room = pool.room;
			const shortage = {
				from,
				to,
				group: pool.group,
				room,
				interval,
				claimed,
				inService,
				short,
				blocks
			};
			found.push(shortage);
			next.set(key, shortage);
		}
		open = next;
	}
	return found;
}

/** The stretches between block edges in which something runs, in order. */
export function* pieces<Claim extends { from: number; to: number }>(
	claims: Claim[]
): Generator<{ from: number; to: number; running: Claim[] }> {
	const edges = [...new Set(claims.flatMap(({ from, to }) => [from, to]))].sort((x, y) => x - y);
	const starting = claims
		.map((claim, order) => ({ claim, order }))
		.sort((x, y) => x.claim.from - y.claim.from);
	let next = 0;
	let running: { claim: Claim; order: number }[] = [];
	for (let i = 0; i + 1 < edges.length; i += 1) {
		const from = edges[i]!;
		running = running.filter(({ claim }) => claim.to > from);
		while (next < starting.length && starting[next]!.claim.from <= from) {
			if (starting[next]!.claim.to > from) running.push(starting[next]!);
			next += 1;
		}
		if (running.length === 0) continue;
		running.sort((x, y) => x.order - y.order);
		yield { from, to: edges[i + 1]!, running: running.map(({ claim }) => claim) };
	}
}

/** Every interval in which the running blocks claim more than is in service. */
export function failures(pool: Pool, running: BlockClaim[]): Failure[] {
	const failing: Failure[] = [];
	for (const [a, b] of intervals(pool, running)) {
		if (!isEnough(pool, running, a, b)) failing.push({ ...countIn(pool, running, a, b), a, b });
	}
	return failing;
}

/** The whole, and from each claimed range's lower end to each one's upper end. */
export function intervals(pool: Pool, running: BlockClaim[]): [number, number][] {
	const all: [number, number][] = [[-Infinity, Infinity]];
	if (!pool.hasLoads) return all;
	const lows = new Set<number>();
	const highs = new Set<number>();
	for (const claim of running) {
		for (const part of claim.parts) {
			for (const { ranges } of part.claimants.values()) {
				for (const { lo, hi } of ranges) {
					if (lo === -Infinity) continue;
					lows.add(lo);
					highs.add(hi);
				}
			}
		}
	}
	for (const a of lows) for (const b of highs) if (a <= b) all.push([a, b]);
	return all;
}

/** Largest `short`, then narrowest, then lowest; what touches one reported is part of it. */
function reported(failing: Failure[]): Failure[] {
	if (failing.length < 2) return failing;
	const ranked = [...failing].sort((x, y) => y.short - x.short || width(x) - width(y) || x.a - y.a);
	const kept: Failure[] = [];
	for (const failure of ranked) {
		if (!kept.some((k) => failure.a <= k.b && k.a <= failure.b)) kept.push(failure);
	}
	return kept;
}

const width = ({ a, b }: Failure): number => (a === -Infinity ? Infinity : b - a);

export function inOrder(found: Shortage[]): Shortage[] {
	return found.sort(
		(x, y) =>
			x.from - y.from ||
			byText(x.group, y.group) ||
			byText(x.room, y.room) ||
			(x.interval?.[0] ?? -Infinity) - (y.interval?.[0] ?? -Infinity)
	);
}

function byText(x: string | null, y: string | null): number {
	if (x === y) return 0;
	if (x === null) return -1;
	return y === null || x > y ? 1 : -1;
}
