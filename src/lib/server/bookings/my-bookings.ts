import { db } from '../db';
import type { BookingStatus } from '../db/schema';
import { slotsByIds, type SlotRow } from '../slots/queries';
import { comingSlotIds, pastBookings } from './queries';

export type MyBookings = {
	coming: SlotRow[];
	past: { id: number; status: BookingStatus; slot: SlotRow }[];
};

/** What a member holds or waits for, the nearest first, and their last twenty classes. */
export async function myBookings(personId: number, { now }: { now: number }): Promise<MyBookings> {
	const [comingIds, before] = await Promise.all([
		comingSlotIds(personId, now),
		pastBookings(personId, now, 20)
	]);
	const reader = { personId };
	const [coming, pastSlots] = await Promise.all([
		slotsByIds(comingIds, reader, db),
		slotsByIds(
			before.map(({ slotId }) => slotId),
			reader,
			db
		)
	]);
	const byId = new Map(pastSlots.map((slot) => [slot.id, slot]));
	return {
		coming,
		past: before.map(({ id, status, slotId }) => ({ id, status, slot: byId.get(slotId)! }))
	};
}
