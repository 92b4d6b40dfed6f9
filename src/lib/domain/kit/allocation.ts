import { boundsOf, type Bound } from './bounds';
import { partsOf, type Kind, type Part } from './kinds';
import {
	rungOf,
	type Problem,
	type ProblemPerson,
	type ProblemSlot,
	type Shortage
} from './problem';
import { relieve, type Going } from './relief';
import { shortages } from './shortages';

/** Slot id -> person id -> station id -> index of its ladder. */
export type Choices = Record<string, Record<string, Record<string, number>>>;

/**
 * Each person's variation at each station, so that nothing runs short; or who is left out,
 * as few as can be, and the first shortage if the first of them joined as chosen.
 */
export type Allocation =
	| { feasible: true; moved: number; steps: number; choices: Choices }
	| { feasible: false; leftOut: string[]; choices: Choices; shortage: Shortage };

/**
 * Planning.md, section 3, exactly: nobody above the choice, the fewest (person, station) pairs
 * off it, then the fewest steps; later bookings move before earlier ones of the same mind.
 * Ask `refusals` first.
 */
export function allocate(problem: Problem): Allocation {
	let [moved, steps] = [0, 0];
	const served: ProblemSlot[] = [];
	const leftOut: { slotId: string; person: ProblemPerson }[] = [];
	for (const slots of clusters(problem)) {
		const answer = serve({ kit: problem.kit, slots }) ?? leaveOut({ kit: problem.kit, slots });
		moved += answer.moved;
		steps += answer.steps;
		served.push(...answer.slots);
		leftOut.push(...answer.leftOut);
	}
	const order = new Map(problem.slots.map(({ id }, i) => [id, i]));
	served.sort((x, y) => order.get(x.id)! - order.get(y.id)!);
	const choices = choicesOf(served);
	const first = leftOut[0];
	if (!first) return { feasible: true, moved, steps, choices };
	const joined = served.map((slot) =>
		slot.id === first.slotId ? { ...slot, people: [...slot.people, first.person] } : slot
	);
	const shortage = shortages({ kit: problem.kit, slots: joined })[0]!;
	return { feasible: false, leftOut: leftOut.map(({ person }) => person.id), choices, shortage };
}

type Served = {
	moved: number;
	steps: number;
	slots: ProblemSlot[];
	leftOut: { slotId: string; person: ProblemPerson }[];
};

/** Slots in sets that bear on one another through kit that could run short; the rest alone. */
function clusters(problem: Problem): ProblemSlot[][] {
	const sets = new Joined(problem.slots);
	for (const bound of boundsOf(problem, problem.slots.flatMap(partsOf))) {
		sets.join(partsIn(bound).map(({ slot }) => slot));
	}
	return sets.all();
}

const partsIn = (bound: Bound): Part[] =>
	bound.rooms.flatMap(({ terms }) => terms.map(({ part }) => part));

/** Everyone served by the fewest moves, or null. Parts that no bound joins are asked apart. */
function serve(problem: Problem, isEnough = false): Served | null {
	const parts = problem.slots.flatMap(partsOf);
	const bounds = boundsOf(problem, parts);
	const sets = new Joined(parts);
	for (const bound of bounds) sets.join(partsIn(bound));
	let [moved, steps] = [0, 0];
	const going: Going[] = [];
	for (const set of sets.all()) {
		const ofSet = bounds.filter((bound) => set.includes(partsIn(bound)[0]!));
		if (ofSet.length === 0) continue;
		const relief = relieve(bookingOrder(set), ofSet, isEnough);
		if (!relief) return null;
		moved += relief.moved;
		steps += relief.steps;
		going.push(...relief.going);
	}
	return { moved, steps, slots: problem.slots.map((slot) => moveDown(slot, going)), leftOut: [] };
}

const bookingOrder = (parts: Part[]): Kind[] =>
	parts.flatMap(({ kinds }) => kinds).sort((x, y) => x.members[0]! - y.members[0]!);

/** The slot with everybody's rungs spelt out; of a kind, the last booked go down first. */
function moveDown(slot: ProblemSlot, going: Going[]): ProblemSlot {
	const stations = slot.blocks.flatMap((block) => block.stations);
	const people = slot.people.map((person) => ({
		...person,
		variations: Object.fromEntries(stations.map((s) => [s.id, rungOf(s, person)]))
	}));
	for (const { kind, ways, counts } of going) {
		if (kind.part.slot !== slot) continue;
		let last = kind.members.length;
		counts.forEach((count, w) => {
			for (let n = 0; n < count; n += 1) {
				const { variations } = people[kind.members[(last -= 1)]!]!;
				kind.part.stations.forEach(({ id }, s) => (variations[id] = ways[w]!.rungs[s]!));
			}
		});
	}
	return { ...slot, people };
}

/** Leaves out one person, then two, and so on, later bookings first, until the rest are served. */
function leaveOut(problem: Problem): Served {
	const minds = likeMinded(problem);
	for (let count = 1; ; count += 1) {
		for (const leftOut of someOf(minds, count, 0)) {
			const slots = problem.slots.map((slot) => ({
				...slot,
				people: slot.people.filter(
					(p) => !leftOut.some((l) => l.slotId === slot.id && l.person === p)
				)
			}));
			if (!serve({ kit: problem.kit, slots }, true)) continue;
			return { ...serve({ kit: problem.kit, slots })!, leftOut };
		}
	}
}

type Someone = { slotId: string; person: ProblemPerson };

/** People of a slot who could stand in for each other, the last booked first. */
function likeMinded(problem: Problem): Someone[][] {
	const minds = new Map<string, Someone[]>();
	for (const { id: slotId, blocks, people } of problem.slots) {
		const stations = blocks.flatMap((block) => block.stations);
		for (const person of [...people].reverse()) {
			const wishes = stations.map((s) => [
				rungOf(s, person),
				s.ladder.map(({ id }) => person.cannot?.includes(id) ?? false),
				Object.entries(person.loads?.[s.id] ?? {}).sort()
			]);
			const key = JSON.stringify([slotId, wishes]);
			minds.set(key, [...(minds.get(key) ?? []), { slotId, person }]);
		}
	}
	return [...minds.values()];
}

function* someOf(minds: Someone[][], count: number, from: number): Generator<Someone[]> {
	if (count === 0) yield [];
	const mind = minds[from];
	if (count === 0 || !mind) return;
	for (let n = Math.min(count, mind.length); n >= 0; n -= 1) {
		for (const rest of someOf(minds, count - n, from + 1)) yield [...mind.slice(0, n), ...rest];
	}
}

function choicesOf(slots: ProblemSlot[]): Choices {
	return Object.fromEntries(
		slots.map(({ id, people }) => [
			id,
			Object.fromEntries(people.map((person) => [person.id, person.variations ?? {}]))
		])
	);
}

/** Sets of things that are joined, directly or through others; in the order given. */
class Joined<Thing> {
	readonly #sets: Map<Thing, Set<Thing>>;

	constructor(things: Thing[]) {
		this.#sets = new Map(things.map((thing) => [thing, new Set([thing])]));
	}

	join([first, ...others]: Thing[]): void {
		for (const other of others) {
			const [into, from] = [this.#sets.get(first!)!, this.#sets.get(other)!];
			if (into === from) continue;
			for (const thing of from) {
				into.add(thing);
				this.#sets.set(thing, into);
			}
		}
	}

	all(): Thing[][] {
		return [...new Set(this.#sets.values())].map((set) => [...set]);
	}
}
