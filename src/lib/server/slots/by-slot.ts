import { and, asc, eq, inArray, sql } from 'drizzle-orm';
import type { Queryable } from '../db';
import { bookings, people, slotCoaches } from '../db/schema';

export async function coachesBySlot(ids: number[], q: Queryable) {
	const rows = await q
		.select({ slotId: slotCoaches.slotId, id: people.id, name: people.name })
		.from(slotCoaches)
		.innerJoin(people, eq(people.id, slotCoaches.personId))
		.where(inArray(slotCoaches.slotId, ids))
		.orderBy(asc(slotCoaches.position), asc(people.name));
	const bySlot = new Map<number, { id: number; name: string }[]>();
	for (const { slotId, ...coach } of rows)
		bySlot.set(slotId, [...(bySlot.get(slotId) ?? []), coach]);
	return bySlot;
}

export async function countsBySlot(ids: number[], q: Queryable) {
	const rows = await q
		.select({ slotId: bookings.slotId, status: bookings.status, n: sql<number>`count(*)` })
		.from(bookings)
		.where(inArray(bookings.slotId, ids))
		.groupBy(bookings.slotId, bookings.status);
	const bySlot = new Map<number, { booked: number; held: number; waitlisted: number }>();
	for (const { slotId, status, n } of rows) {
		const counts = bySlot.get(slotId) ?? { booked: 0, held: 0, waitlisted: 0 };
		if (status === 'held') counts.held += n;
		else if (status === 'waitlisted') counts.waitlisted += n;
		else if (status === 'booked' || status === 'attended' || status === 'no-show')
			counts.booked += n;
		bySlot.set(slotId, counts);
	}
	return bySlot;
}

export async function mineBySlot(ids: number[], personId: number, q: Queryable) {
	const rows = await q
		.select({
			id: bookings.id,
			slotId: bookings.slotId,
			status: bookings.status,
			position: queuePosition
		})
		.from(bookings)
		.where(
			and(
				eq(bookings.personId, personId),
				inArray(bookings.slotId, ids),
				inArray(bookings.status, ['held', 'booked', 'waitlisted', 'attended', 'no-show'])
			)
		);
	return new Map(rows.map(({ slotId, ...mine }) => [slotId, mine]));
}

/** A waiting booking's turn, from 1; null for any other. For selects from `bookings`. */
export const queuePosition = sql<number | null>`case when bookings.status = 'waitlisted' then (
	select count(*) from bookings q where q.slot_id = bookings.slot_id and q.status = 'waitlisted'
	and (coalesce(q.queue_rank, q.id), q.id) <= (coalesce(bookings.queue_rank, bookings.id), bookings.id)
) end`;
