import { and, asc, eq, inArray } from 'drizzle-orm';
import type { Choices } from '$lib/domain/training';
import { db, type Queryable } from '../db';
import { bookings, people } from '../db/schema';
import { countingOn } from './affected';

/** What somebody who counts on a slot chose there. */
export type Choosing = {
	slotId: number;
	bookingId: number;
	personId: number;
	name: string;
	choices: Choices;
};

export async function choicesOn(
	slotIds: readonly number[],
	q: Queryable = db
): Promise<Choosing[]> {
	const rows = await q
		.select({
			slotId: bookings.slotId,
			bookingId: bookings.id,
			personId: people.id,
			name: people.name,
			variations: bookings.variations,
			loads: bookings.loads
		})
		.from(bookings)
		.innerJoin(people, eq(people.id, bookings.personId))
		.where(and(inArray(bookings.slotId, [...slotIds]), inArray(bookings.status, [...countingOn])))
		.orderBy(asc(bookings.id));
	return rows.map(({ variations, loads, ...row }) => ({ ...row, choices: { variations, loads } }));
}
