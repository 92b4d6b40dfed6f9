import { eq, inArray, sql } from 'drizzle-orm';
import { db, type Queryable } from '../db';
import { classTypes, rooms, slotCoaches, slots } from '../db/schema';
import type { SlotLimits } from './places';

/** What limits each slot besides the kit. */
export async function limitsOfSlots(
	ids: readonly number[],
	q: Queryable = db
): Promise<Map<number, SlotLimits>> {
	const rows = await q
		.select({
			id: slots.id,
			roomPlaces: rooms.places,
			peoplePerCoach: classTypes.peoplePerCoach,
			setPlaces: slots.setPlaces,
			coaches: sql<number>`(select count(*) from ${slotCoaches} where ${slotCoaches.slotId} = ${slots.id})`
		})
		.from(slots)
		.innerJoin(rooms, eq(rooms.id, slots.roomId))
		.innerJoin(classTypes, eq(classTypes.id, slots.classTypeId))
		.where(inArray(slots.id, [...ids]));
	return new Map(rows.map(({ id, ...limits }) => [id, limits]));
}
