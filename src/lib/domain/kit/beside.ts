import { slotClaims, type BlockClaim } from './claims';
import { countIn, Pools, type Pool } from './pools';
import type { Problem, ProblemPerson, ProblemSlot, Shortage } from './problem';
import { byPool, failures, inOrder, pieces, shortagesOf, type Failure } from './shortages';

/**
 * A slot's surroundings: the kit, what the other slots claim as they stand, and what the people
 * `present` in the slot claim already. Claims of the slot are weighed against that.
 */
export class Beside {
	readonly #slotId: string;
	readonly #pools: Pools;
	readonly #others: BlockClaim[];
	readonly #present: BlockClaim[];
	readonly #order: Map<string, number>;

	constructor(problem: Problem, slot: ProblemSlot, present: readonly ProblemPerson[] = []) {
		const from = Math.min(...slot.blocks.map(({ startS }) => slot.startS + startS));
		const to = Math.max(...slot.blocks.map(({ endS }) => slot.startS + endS));
		this.#slotId = slot.id;
		this.#pools = new Pools(problem.kit);
		this.#order = new Map(problem.slots.map(({ id }, order) => [id, order]));
		this.#present = slotClaims(slot, present);
		this.#others = problem.slots
			.filter((other) => other.id !== slot.id)
			.flatMap((other) => slotClaims(other, other.people))
			.filter((claim) => claim.from < to && claim.to > from);
	}

	/** Whether these claims of the slot make a shortage, or a larger one, than there is without them. */
	isWorse(claims: BlockClaim[]): boolean {
		for (const [pool, own] of this.#byPool(claims)) {
			for (const { running } of pieces(this.#around(pool, own))) {
				const isOwn = running.some(({ slotId }) => slotId === this.#slotId);
				if (isOwn && this.#worse(pool, running).length > 0) return true;
			}
		}
		return false;
	}

	/** The shortages that these claims make or make larger, first in time first. */
	made(claims: BlockClaim[]): Shortage[] {
		const found: Shortage[] = [];
		for (const [pool, own] of this.#byPool(claims)) {
			found.push(
				...shortagesOf(pool, this.#around(pool, own), (p, running) => this.#worse(p, running))
			);
		}
		return inOrder(found);
	}

	/** Intervals that fall shorter with these claims of the slot than with those present alone. */
	#worse(pool: Pool, running: BlockClaim[]): Failure[] {
		const failing = failures(pool, running);
		if (failing.length === 0) return failing;
		const own = new Set(
			running.filter(({ slotId }) => slotId === this.#slotId).map(({ label }) => label)
		);
		const without = [
			...running.filter(({ slotId }) => slotId !== this.#slotId),
			...this.#present.filter(({ group, label }) => group === pool.group && own.has(label))
		];
		return failing.filter(({ a, b, short }) => short > countIn(pool, without, a, b).short);
	}

	#byPool(claims: BlockClaim[]): Map<Pool, BlockClaim[]> {
		const groups = new Map<string, BlockClaim[]>();
		for (const claim of claims)
			groups.set(claim.group, [...(groups.get(claim.group) ?? []), claim]);
		return new Map([...groups].flatMap(([group, own]) => [...byPool(this.#pools, group, own)]));
	}

	#around(pool: Pool, own: BlockClaim[]): BlockClaim[] {
		const others = this.#others.filter(
			({ group, room }) => group === pool.group && (pool.room === null || pool.room === room)
		);
		if (others.length === 0) return own;
		const order = ({ slotId }: BlockClaim) => this.#order.get(slotId) ?? 0;
		return [...others, ...own].sort((x, y) => order(x) - order(y));
	}
}
