import { Beside } from './beside';
import { slotClaims } from './claims';
import {
	personAsWritten,
	type Problem,
	type ProblemPerson,
	type ProblemSlot,
	type Shortage
} from './problem';
import { canMove } from './regressions';

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
