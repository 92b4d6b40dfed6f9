import { asc, eq, inArray, type SQL } from 'drizzle-orm';
import { db, type Queryable } from '../db';
import { slotCoaches, slots } from '../db/schema';

/** A slot with its coaches, lead coach first. */
export type SlotWithCoaches = typeof slots.$inferSelect & { coachIds: number[] };

export async function loadSlot(id: number, q: Queryable = db): Promise<SlotWithCoaches | null> {
	const [slot] = await loadSlots(eq(slots.id, id), q);
	return slot ?? null;
}

export const loadSlotsById = (ids: readonly number[], q: Queryable = db) =>
	loadSlots(inArray(slots.id, [...ids]), q);

/** Slots of one series, those called off too, by start. */
export const loadSlotsOfSeries = (seriesId: number, q: Queryable = db) =>
	loadSlots(eq(slots.seriesId, seriesId), q);

export async function loadSlots(where: SQL | undefined, q: Queryable): Promise<SlotWithCoaches[]> {
	const rows = await q
		.select()
		.from(slots)
		.where(where)
		.orderBy(asc(slots.startsAt), asc(slots.id));
	const coaches = await q
		.select({ slotId: slotCoaches.slotId, personId: slotCoaches.personId })
		.from(slotCoaches)
		.innerJoin(slots, eq(slots.id, slotCoaches.slotId))
		.where(where)
		.orderBy(asc(slotCoaches.position), asc(slotCoaches.personId));
	const bySlot = new Map<number, number[]>();
	for (const { slotId, personId } of coaches) {
		bySlot.set(slotId, [...(bySlot.get(slotId) ?? []), personId]);
	}
	return rows.map((slot) => ({ ...slot, coachIds: bySlot.get(slot.id) ?? [] }));
}
