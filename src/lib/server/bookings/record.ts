import { eq } from 'drizzle-orm';
import type { Tx } from '../db';
import { bookingChanges, bookings, type BookingStatus } from '../db/schema';

/** Changes a booking's status and says who did it and when. */
export async function changeStatus(
	tx: Tx,
	booking: { id: number; status: BookingStatus },
	to: BookingStatus,
	fact: { now: number; byId: number | null; why?: string },
	also: Partial<typeof bookings.$inferInsert> = {}
): Promise<void> {
	await tx
		.update(bookings)
		.set({ status: to, updatedAt: fact.now, ...also })
		.where(eq(bookings.id, booking.id));
	await tx.insert(bookingChanges).values({
		bookingId: booking.id,
		fromStatus: booking.status,
		toStatus: to,
		at: fact.now,
		byId: fact.byId,
		why: fact.why
	});
}
