import { and, asc, eq, inArray, sql } from 'drizzle-orm';
import { db, type Queryable } from '../db';
import {
	bookings,
	people,
	slotCoaches,
	type BookingStatus,
	type LoadChoices,
	type VariationChoices
} from '../db/schema';
import type { Viewer } from '../guard';
import { queuePosition } from '../slots/by-slot';

export type RollRow = {
	bookingId: number;
	personId: number;
	name: string;
	status: BookingStatus;
	isLate: boolean;
	isWalkIn: boolean;
	checkedInAt: number | null;
	note: string | null;
	/** What a coach should know, in the member's own words. */
	personNote: string | null;
	variations: VariationChoices;
	loads: LoadChoices;
	passId: number | null;
	complimentaryWhy: string | null;
	/** Nobody of this name came before. */
	isFirst: boolean;
	position: number | null;
};

const onRoll = ['held', 'booked', 'waitlisted', 'attended', 'no-show'] as const;

/** Everybody of a class by name, then who waits, in their order. */
export async function rollOf(slotId: number, q: Queryable = db): Promise<RollRow[]> {
	const rows = await q
		.select({
			bookingId: bookings.id,
			personId: bookings.personId,
			name: people.name,
			status: bookings.status,
			isLate: bookings.isLate,
			isWalkIn: bookings.isWalkIn,
			checkedInAt: bookings.checkedInAt,
			note: bookings.note,
			personNote: people.note,
			variations: bookings.variations,
			loads: bookings.loads,
			passId: bookings.passId,
			complimentaryWhy: bookings.complimentaryWhy,
			isFirst: sql<boolean>`not exists (
				select 1 from bookings b where b.person_id = ${bookings.personId} and b.status = 'attended' and b.id <> ${bookings.id}
			)`.mapWith(Boolean),
			position: queuePosition
		})
		.from(bookings)
		.innerJoin(people, eq(people.id, bookings.personId))
		.where(and(eq(bookings.slotId, slotId), inArray(bookings.status, [...onRoll])))
		.orderBy(asc(people.name), asc(bookings.id));
	return rows.sort((a, b) => (a.position ?? 0) - (b.position ?? 0));
}

/** Whether somebody may see and take a class's roll: any class with `roll:take`, else those they coach. */
export async function mayTakeRoll(
	viewer: Pick<Viewer, 'personId' | 'capabilities'>,
	slotId: number,
	q: Queryable = db
): Promise<boolean> {
	if (viewer.capabilities.has('roll:take')) return true;
	const [coaching] = await q
		.select({ id: slotCoaches.slotId })
		.from(slotCoaches)
		.where(and(eq(slotCoaches.slotId, slotId), eq(slotCoaches.personId, viewer.personId)));
	return coaching !== undefined;
}
