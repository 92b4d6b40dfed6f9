import { places, shortages, type Places, type Shortage } from '$lib/domain/kit';
import { slotClaims, claimedWithin } from '$lib/domain/kit/claims';
import { firstPeople } from '$lib/domain/kit/places';
import type { Library } from '../kit/library';
import { kitRegister } from '../kit/in-service';
import { library } from '../kit/library';
import { problemOf } from '../kit/plan';
import { limitsOf, type SlotLimits } from './places';
import { planSlotsBetween } from './plan-slots';
import type { SlotRow } from './queries';

/** A kit group over the time of a slot: what is in service and which classes claim how many, when. */
export type KitLane = {
	group: string;
	name: string;
	inService: number;
	/** Instants are epoch ms. `blockId` is null where no session is laid. */
	claims: { slotId: number; roomId: number; from: number; to: number; count: number }[];
};

export type KitOfSlot = {
	places: Places;
	lanes: KitLane[];
	shortages: Shortage[];
	/** The instant from which the rules count seconds. */
	clockAt: number;
	library: Library;
};

/**
 * The kit of a slot at its planned places: everyone as many as other limits allow, those booked as
 * they chose, the rest as written; the other slots as they stand.
 */
export async function kitOfSlot(slot: SlotRow, limits: SlotLimits): Promise<KitOfSlot | null> {
	const [around, lib, register] = await Promise.all([
		planSlotsBetween(slot.startsAt, slot.endsAt),
		library(),
		kitRegister(slot.startsAt, slot.endsAt)
	]);
	if (!around.some(({ id }) => id === slot.id)) return null;
	const problem = problemOf(around, lib, register);
	const asked = { slotId: String(slot.id), limits: limitsOf(limits) };
	const answer = places(problem, asked);
	const own = problem.slots.find(({ id }) => id === String(slot.id))!;
	const planned = Math.max(own.people.length, answer.limit);
	own.people = firstPeople(own, own.people.length, planned);
	const clockAt = Math.min(...around.map(({ startsAt }) => startsAt));
	const lanes = new Map<string, KitLane>();
	for (const each of problem.slots) {
		for (const claim of slotClaims(each, each.people)) {
			const count = claimedWithin(claim, -Infinity, Infinity);
			if (count === 0) continue;
			const lane = lanes.get(claim.group) ?? {
				group: claim.group,
				name: lib.groups[claim.group]?.plural ?? claim.group,
				inService: problem.kit
					.filter((item) => item.group === claim.group)
					.reduce((sum, item) => sum + item.inService, 0),
				claims: []
			};
			lane.claims.push({
				slotId: Number(each.id),
				roomId: Number(each.room),
				from: clockAt + claim.from * 1000,
				to: clockAt + claim.to * 1000,
				count
			});
			lanes.set(claim.group, lane);
		}
	}
	const used = [...lanes.values()].filter(({ claims }) => claims.some((c) => c.slotId === slot.id));
	return { places: answer, lanes: used, shortages: shortages(problem), clockAt, library: lib };
}
