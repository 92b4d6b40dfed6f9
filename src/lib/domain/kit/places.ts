import { slotClaims, type BlockClaim } from './claims';
import { countIn, Pools, type Pool } from './pools';
import {
	personAsWritten,
	type Problem,
	type ProblemPerson,
	type ProblemSlot,
	type Shortage
} from './problem';
import { canMove } from './regressions';
import { byPool, failures, inOrder, pieces, shortagesOf, type Failure } from './shortages';

/** `booked`: only the first so many people of the slot are booked. A null limit does not bind. */
export type PlacesAsk = {
	slotId: string;
	booked?: number;
	limits: { room: number | null; ratio: number | null; coaches: number | null; set: number | null };
};

export type LimitedBy = 'room' | 'coach' | 'set' | 'kit';

/** `asWritten` and `withRegressions` are the kit's numbers; the bottleneck is its, where it binds. */
export type Places = {
	asWritten: number;
	withRegressions: number;
	limit: number;
	limitedBy: LimitedBy;
	bottleneck: Shortage | null;
};

/** Nobody's kit is counted past this many people, where neither room nor coach nor hand sets a limit. */
const mostPeople = 1000;

/**
 * How many people a slot takes and what limits it: planning.md, section 4, beside the other
 * slots as they stand. Ask `refusals` first.
 * @throws RangeError when the problem has no such slot
 */
export function places(problem: Problem, ask: PlacesAsk): Places {
	const slot = problem.slots.find(({ id }) => id === ask.slotId);
	if (!slot) throw new RangeError(`no slot ${ask.slotId}`);
	const others = otherLimits(ask);
	const most = Math.min(mostPeople, ...others.map(({ limit }) => limit));
	const booked = Math.min(ask.booked ?? slot.people.length, slot.people.length);
	const beside = new Beside(problem, slot);

	const fits = (n: number) => !beside.isWorse(slotClaims(slot, firstPeople(slot, booked, n)));
	const asWritten = largest(0, most, fits);
	const withRegressions = largest(asWritten, most, (n) => {
		const people = firstPeople(slot, booked, n);
		return canMove(slot, people, booked, (claims) => beside.isWorse(claims));
	});

	const binding = others.find(({ limit }) => limit === most);
	if (binding && asWritten >= most) {
		return { asWritten, withRegressions, limit: most, limitedBy: binding.by, bottleneck: null };
	}
	const next = slotClaims(slot, firstPeople(slot, booked, asWritten + 1));
	const bottleneck = beside.made(next)[0] ?? null;
	return { asWritten, withRegressions, limit: asWritten, limitedBy: 'kit', bottleneck };
}

function otherLimits({ limits }: PlacesAsk): { by: LimitedBy; limit: number }[] {
	const { room, ratio, coaches, set } = limits;
	const all: { by: LimitedBy; limit: number }[] = [];
	if (room !== null) all.push({ by: 'room', limit: room });
	if (ratio !== null && coaches !== null) all.push({ by: 'coach', limit: ratio * coaches });
	if (set !== null) all.push({ by: 'set', limit: set });
	return all.map(({ by, limit }) => ({ by, limit: Math.max(0, limit) }));
}

/** The first `n` of those booked, then the typical in turn; as written where there are none. */
export function firstPeople(slot: ProblemSlot, booked: number, n: number): ProblemPerson[] {
	const typical = slot.typical.length > 0 ? slot.typical : [personAsWritten];
	return Array.from({ length: n }, (_, i) =>
		i < booked ? slot.people[i]! : typical[(i - booked) % typical.length]!
	);
}

/** The largest n from `low` to `high` that fits. More people never claim less, so halving finds it. */
function largest(low: number, high: number, fits: (n: number) => boolean): number {
	if (high <= low || fits(high)) return Math.max(low, high);
	let [yes, no] = [low, high];
	while (no - yes > 1) {
		const middle = (yes + no) >> 1;
		if (fits(middle)) yes = middle;
		else no = middle;
	}
	return yes;
}

/** A slot's surroundings: the kit and what the other slots claim, as they stand. */
export class Beside {
	readonly #pools: Pools;
	readonly #others: BlockClaim[];
	readonly #order: Map<string, number>;

	constructor(problem: Problem, slot: ProblemSlot) {
		const from = Math.min(...slot.blocks.map(({ startS }) => slot.startS + startS));
		const to = Math.max(...slot.blocks.map(({ endS }) => slot.startS + endS));
		this.#pools = new Pools(problem.kit);
		this.#order = new Map(problem.slots.map(({ id }, order) => [id, order]));
		this.#others = problem.slots
			.filter((other) => other.id !== slot.id)
			.flatMap((other) => slotClaims(other, other.people))
			.filter((claim) => claim.from < to && claim.to > from);
	}

	/** Whether these claims of the slot make a shortage, or a larger one, than there is without them. */
	isWorse(claims: BlockClaim[]): boolean {
		for (const [pool, own] of this.#byPool(claims)) {
			for (const { running } of pieces(this.#around(pool, own))) {
				if (
					running.some(({ slotId }) => slotId === own[0]!.slotId) &&
					worse(pool, running, own[0]!.slotId).length
				) {
					return true;
				}
			}
		}
		return false;
	}

	/** The shortages that these claims make or make larger, first in time first. */
	made(claims: BlockClaim[]): Shortage[] {
		const found: Shortage[] = [];
		for (const [pool, own] of this.#byPool(claims)) {
			const { slotId } = own[0]!;
			found.push(
				...shortagesOf(pool, this.#around(pool, own), (p, running) => worse(p, running, slotId))
			);
		}
		return inOrder(found);
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

/** Intervals that fall shorter with the slot's claims than without them. */
function worse(pool: Pool, running: BlockClaim[], slotId: string): Failure[] {
	const failing = failures(pool, running);
	if (failing.length === 0) return failing;
	const without = running.filter((claim) => claim.slotId !== slotId);
	return failing.filter(({ a, b, short }) => short > countIn(pool, without, a, b).short);
}
