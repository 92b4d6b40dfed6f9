import { and, asc, eq, inArray } from 'drizzle-orm';
import { db, type Queryable, type Tx } from '../db';
import { bookings, people } from '../db/schema';
import { giveBackCredit } from '../passes/credits';
import { changeStatus } from './record';

export type Affected = {
	id: number;
	personId: number;
	name: string;
	email: string | null;
	slotId: number;
	status: 'held' | 'booked' | 'waitlisted';
};

/** Who holds a place or waits in these slots: the people that a change of staff affects. */
export async function affectedBy(slotIds: number[], q: Queryable = db): Promise<Affected[]> {
	if (slotIds.length === 0) return [];
	const rows = await q
		.select({
			id: bookings.id,
			personId: bookings.personId,
			name: people.name,
			email: people.email,
			slotId: bookings.slotId,
			status: bookings.status
		})
		.from(bookings)
		.innerJoin(people, eq(people.id, bookings.personId))
		.where(
			and(
				inArray(bookings.slotId, slotIds),
				inArray(bookings.status, ['held', 'booked', 'waitlisted'])
			)
		)
		.orderBy(asc(bookings.id));
	return rows as Affected[];
}

/** Ends a booking because the gym called its class off: the credit comes back, whenever it is. */
export async function release(
	tx: Tx,
	booking: Pick<Affected, 'id' | 'status'>,
	fact: { now: number; byId: number | null; why: string }
): Promise<void> {
	await changeStatus(tx, booking, 'released', fact);
	await giveBackCredit(tx, booking.id, fact);
}
