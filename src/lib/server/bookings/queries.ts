import { and, asc, desc, eq, gt, gte, inArray, lt } from 'drizzle-orm';
import { db, type Queryable } from '../db';
import {
	bookings,
	slots,
	type BookingStatus,
	type LoadChoices,
	type VariationChoices
} from '../db/schema';
import { queuePosition } from '../slots/by-slot';

export type OwnBooking = {
	id: number;
	slotId: number;
	status: BookingStatus;
	position: number | null;
	variations: VariationChoices;
	loads: LoadChoices;
	note: string | null;
	createdAt: number;
};

const columns = {
	id: bookings.id,
	slotId: bookings.slotId,
	status: bookings.status,
	position: queuePosition,
	variations: bookings.variations,
	loads: bookings.loads,
	note: bookings.note,
	createdAt: bookings.createdAt
};

/** A person's bookings of slots that start from `fromAt` until just before `toAt`, ended ones too. */
export const bookingsOf = (
	personId: number,
	fromAt: number,
	toAt: number,
	q: Queryable = db
): Promise<OwnBooking[]> =>
	q
		.select(columns)
		.from(bookings)
		.innerJoin(slots, eq(slots.id, bookings.slotId))
		.where(
			and(eq(bookings.personId, personId), gte(slots.startsAt, fromAt), lt(slots.startsAt, toAt))
		)
		.orderBy(asc(slots.startsAt), asc(bookings.id));

/** The live booking of a person in a slot. */
export async function liveBooking(
	personId: number,
	slotId: number,
	q: Queryable = db
): Promise<OwnBooking | null> {
	const [row] = await q
		.select(columns)
		.from(bookings)
		.where(
			and(
				eq(bookings.personId, personId),
				eq(bookings.slotId, slotId),
				inArray(bookings.status, ['held', 'booked', 'waitlisted', 'attended', 'no-show'])
			)
		);
	return row ?? null;
}

/** Ids of the slots that a person holds or waits for from `fromAt` on, the nearest first. */
export const comingSlotIds = async (
	personId: number,
	fromAt: number,
	q: Queryable = db
): Promise<number[]> =>
	(
		await q
			.select({ id: slots.id })
			.from(bookings)
			.innerJoin(slots, eq(slots.id, bookings.slotId))
			.where(
				and(
					eq(bookings.personId, personId),
					gt(slots.endsAt, fromAt),
					inArray(bookings.status, ['held', 'booked', 'waitlisted', 'attended'])
				)
			)
			.orderBy(asc(slots.startsAt))
	).map(({ id }) => id);

/** A person's last bookings that are over, the newest first. */
export const pastBookings = (
	personId: number,
	beforeAt: number,
	limit: number,
	q: Queryable = db
) =>
	q
		.select({ ...columns, startsAt: slots.startsAt })
		.from(bookings)
		.innerJoin(slots, eq(slots.id, bookings.slotId))
		.where(and(eq(bookings.personId, personId), lt(slots.endsAt, beforeAt)))
		.orderBy(desc(slots.startsAt))
		.limit(limit);
