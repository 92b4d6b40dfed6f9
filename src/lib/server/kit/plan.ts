import type { Problem, ProblemPerson, ProblemSlot } from '$lib/domain/kit';
import { claimantOf, stationsOf, type Choices, type SessionContent } from '$lib/domain/training';
import type { DefaultClaim } from '../db/schema';
import { inServiceDuring, type KitRegister } from './in-service';
import type { Library } from './library';

/** A slot as the kit rules need it. `people` are in, in booking order: held, booked or come. */
export type PlanSlot = {
	id: number;
	startsAt: number;
	endsAt: number;
	roomId: number;
	/** Null where no session is laid: then the class type's default claims count. */
	content: SessionContent | null;
	defaultClaims: DefaultClaim[];
	people: { bookingId: number; choices: Choices }[];
};

/**
 * The kit problem of slots that share a clock (planning.md, section 2), whether their sessions
 * are published or not. Times count from `clockAt`, the earliest start; rooms are `String(roomId)`,
 * slots `String(id)`, people `String(bookingId)`.
 */
export function problemOf(slots: PlanSlot[], library: Library, register: KitRegister): Problem {
	const clockAt = Math.min(...slots.map(({ startsAt }) => startsAt));
	const untilAt = Math.max(...slots.map(({ endsAt }) => endsAt));
	return {
		kit: inServiceDuring(register, library, clockAt, untilAt),
		slots: slots.map((slot) => problemSlot(slot, library, clockAt))
	};
}

export function problemSlot(slot: PlanSlot, library: Library, clockAt: number): ProblemSlot {
	const common = {
		id: String(slot.id),
		startS: Math.round((slot.startsAt - clockAt) / 1000),
		room: String(slot.roomId)
	};
	const laid = slot.content && stationsOf(slot.content, library.rules);
	if (!slot.content || !laid?.ok) return { ...common, ...byDefault(slot) };
	const person = (id: string, choices: Choices): ProblemPerson =>
		claimantOf(id, choices, slot.content!, library.rules, library.loadedGroups);
	return {
		...common,
		blocks: laid.blocks,
		people: slot.people.map(({ bookingId, choices }) => person(String(bookingId), choices)),
		typical: [person('as written', {})]
	};
}

/** One block over the whole slot, at which each person needs what the class type claims. */
function byDefault(slot: PlanSlot): Pick<ProblemSlot, 'blocks' | 'people' | 'typical'> {
	const needs = slot.defaultClaims.map(({ kitGroupId, quantity, peoplePerPiece }) => ({
		group: String(kitGroupId),
		quantity,
		peoplePerPiece
	}));
	const endS = Math.round((slot.endsAt - slot.startsAt) / 1000);
	const station = { id: 'class', ladder: [{ id: 'class', needs }], asWritten: 0 };
	return {
		blocks: [{ id: 'class', startS: 0, endS, rotation: 'together', waves: 1, stations: [station] }],
		people: slot.people.map(({ bookingId }) => ({
			id: String(bookingId),
			variations: {},
			loads: {}
		})),
		typical: []
	};
}

/** Splits slots into sets that some time joins: those of different sets never share kit. */
export function clustersOf<T extends { startsAt: number; endsAt: number }>(slots: T[]): T[][] {
	const clusters: T[][] = [];
	let untilAt = -Infinity;
	for (const slot of [...slots].sort((a, b) => a.startsAt - b.startsAt)) {
		if (slot.startsAt >= untilAt) clusters.push([]);
		clusters.at(-1)!.push(slot);
		untilAt = Math.max(untilAt, slot.endsAt);
	}
	return clusters;
}
