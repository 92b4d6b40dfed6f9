import { eq } from 'drizzle-orm';
import type { Tx } from '../db';
import { prepared } from '../db/prepared';
import { bookingChanges, bookings, type BookingStatus } from '../db/schema';

type NewBooking = Pick<
	typeof bookings.$inferSelect,
	| 'slotId'
	| 'personId'
	| 'status'
	| 'variations'
	| 'loads'
	| 'note'
	| 'passId'
	| 'complimentaryById'
	| 'complimentaryWhy'
	| 'isWalkIn'
> & { now: number; byId: number };

const insertBooking = prepared<NewBooking>()((q, at) =>
	q
		.insert(bookings)
		.values({
			slotId: at('slotId'),
			personId: at('personId'),
			status: at('status'),
			variations: at('variations'),
			loads: at('loads'),
			note: at('note'),
			passId: at('passId'),
			complimentaryById: at('complimentaryById'),
			complimentaryWhy: at('complimentaryWhy'),
			isWalkIn: at('isWalkIn'),
			createdAt: at('now'),
			createdById: at('byId'),
			updatedAt: at('now')
		})
		.returning({ id: bookings.id })
);

type Change = Pick<typeof bookingChanges.$inferSelect, 'bookingId' | 'toStatus' | 'at' | 'byId'>;

const insertFirstChange = prepared<Change>()((q, at) =>
	q.insert(bookingChanges).values({
		bookingId: at('bookingId'),
		toStatus: at('toStatus'),
		at: at('at'),
		byId: at('byId')
	})
);

/** Enters a booking and says who did it and when. @returns its id */
export async function recordBooking(tx: Tx, booking: NewBooking): Promise<number> {
	const [row] = await insertBooking(tx, booking);
	const { status, now, byId } = booking;
	await insertFirstChange(tx, { bookingId: row!.id, toStatus: status, at: now, byId });
	return row!.id;
}

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
