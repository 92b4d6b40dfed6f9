import { places, type Places } from '$lib/domain/kit';
import { db, type Queryable } from '../db';
import { kitRegister } from '../kit/in-service';
import { library } from '../kit/library';
import { clustersOf, problemOf, type PlanSlot } from '../kit/plan';
import { planSlotsBetween } from './plan-slots';

/** What limits a slot besides the kit. */
export type SlotLimits = {
	roomPlaces: number;
	coaches: number;
	peoplePerCoach: number | null;
	setPlaces: number | null;
};

/** The limits as the rules ask for them: a room's posted number counts the coaches too. */
export const limitsOf = ({ roomPlaces, coaches, peoplePerCoach, setPlaces }: SlotLimits) => ({
	room: Math.max(0, roomPlaces - coaches),
	ratio: peoplePerCoach,
	coaches: peoplePerCoach === null ? null : coaches,
	set: setPlaces
});

/**
 * How many people each slot takes and what decides it, beside the other slots with the people
 * in them. `limits` has the slots asked about; the time spans them all (epoch ms).
 */
export async function placesOf(
	limits: Map<number, SlotLimits>,
	fromAt: number,
	toAt: number,
	q: Queryable = db
): Promise<Map<number, Places>> {
	const [around, lib, register] = await Promise.all([
		planSlotsBetween(fromAt, toAt, q),
		library(q),
		kitRegister(fromAt, toAt, q)
	]);
	const answers = new Map<number, Places>();
	for (const cluster of clustersOf(around)) {
		const asked = cluster.filter(({ id }) => limits.has(id));
		if (asked.length === 0) continue;
		const problem = problemOf(cluster, lib, register);
		for (const slot of asked) answers.set(slot.id, placesIn(problem, slot, limits.get(slot.id)!));
	}
	return answers;
}

const placesIn = (
	problem: ReturnType<typeof problemOf>,
	slot: PlanSlot,
	limits: SlotLimits
): Places => places(problem, { slotId: String(slot.id), limits: limitsOf(limits) });
