import { and, asc, eq, sql } from 'drizzle-orm';
import { db, type Queryable, type Tx } from '../db';
import { bookings, people, type LoadChoices, type VariationChoices } from '../db/schema';
import { queuePosition } from '../slots/by-slot';

export type Waiting = {
	id: number;
	personId: number;
	name: string;
	email: string | null;
	status: 'waitlisted';
	variations: VariationChoices;
	loads: LoadChoices;
	complimentaryWhy: string | null;
};

/** Who waits for a slot, first come first: by rank, then by number. */
export async function waitlistOf(slotId: number, q: Queryable = db): Promise<Waiting[]> {
	const rows = await q
		.select({
			id: bookings.id,
			personId: bookings.personId,
			name: people.name,
			email: people.email,
			variations: bookings.variations,
			loads: bookings.loads,
			complimentaryWhy: bookings.complimentaryWhy
		})
		.from(bookings)
		.innerJoin(people, eq(people.id, bookings.personId))
		.where(and(eq(bookings.slotId, slotId), eq(bookings.status, 'waitlisted')))
		.orderBy(asc(sql`coalesce(${bookings.queueRank}, ${bookings.id})`), asc(bookings.id));
	return rows.map((row) => ({ ...row, status: 'waitlisted' }));
}

/** A waiting booking's turn, from 1. */
export async function positionOf(tx: Tx, bookingId: number): Promise<number> {
	const row = await tx
		.select({ position: queuePosition })
		.from(bookings)
		.where(eq(bookings.id, bookingId))
		.get();
	return row?.position ?? 0;
}
