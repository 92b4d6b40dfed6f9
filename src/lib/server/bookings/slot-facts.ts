import { and, asc, eq, gt, inArray, isNull, lt, ne, sql } from 'drizzle-orm';
import type { SessionContent } from '$lib/domain/training';
import type { Queryable, Tx } from '../db';
import { bookings, classTypes, gyms, rooms, slotCoaches, slots } from '../db/schema';
import { revisionContents } from '../slots/plan-slots';
import type { SlotLimits } from '../slots/places';

/** What a booking command must know of its slot, read in one go. */
export type SlotFacts = SlotLimits & {
	id: number;
	uid: string;
	startsAt: number;
	endsAt: number;
	startsOn: string;
	cancelledAt: number | null;
	content: SessionContent | null;
	className: string;
	about: string;
	whoMayBook: 'anyone' | 'pass-holders' | 'staff';
	opensDaysBefore: number;
	closesMinBefore: number;
	cutOffMin: number | null;
	cutOffClock: string | null;
	zone: string;
	weekStartsOn: number;
};

export async function slotFacts(tx: Queryable, slotId: number): Promise<SlotFacts | null> {
	const row = await tx
		.select({
			id: slots.id,
			uid: slots.uid,
			startsAt: slots.startsAt,
			endsAt: slots.endsAt,
			startsOn: slots.startsOn,
			cancelledAt: slots.cancelledAt,
			revisionId: slots.sessionRevisionId,
			setPlaces: slots.setPlaces,
			roomPlaces: rooms.places,
			coaches: sql<number>`(select count(*) from ${slotCoaches} where ${slotCoaches.slotId} = ${slots.id})`,
			peoplePerCoach: classTypes.peoplePerCoach,
			className: classTypes.name,
			about: classTypes.about,
			whoMayBook: classTypes.whoMayBook,
			opensDaysBefore: classTypes.opensDaysBefore,
			closesMinBefore: classTypes.closesMinBefore,
			cutOffMin: classTypes.cutOffMin,
			cutOffClock: classTypes.cutOffClock,
			zone: gyms.zone,
			weekStartsOn: gyms.weekStartsOn
		})
		.from(slots)
		.innerJoin(classTypes, eq(classTypes.id, slots.classTypeId))
		.innerJoin(rooms, eq(rooms.id, slots.roomId))
		.innerJoin(gyms, eq(gyms.id, 1))
		.where(eq(slots.id, slotId))
		.get();
	if (!row) return null;
	const { revisionId, ...facts } = row;
	const content =
		revisionId === null ? null : ((await revisionContents([revisionId])).get(revisionId) ?? null);
	return { ...facts, content };
}

const live = ['held', 'booked', 'waitlisted', 'attended'] as const;

/** A live booking of the person in another class that runs at the same time; touching is no overlap. */
export async function overlappingBooking(
	tx: Tx,
	personId: number,
	slot: Pick<SlotFacts, 'id' | 'startsAt' | 'endsAt'>
): Promise<{ className: string; startsAt: number } | null> {
	const [row] = await tx
		.select({ className: classTypes.name, startsAt: slots.startsAt })
		.from(bookings)
		.innerJoin(slots, eq(slots.id, bookings.slotId))
		.innerJoin(classTypes, eq(classTypes.id, slots.classTypeId))
		.where(
			and(
				eq(bookings.personId, personId),
				inArray(bookings.status, [...live]),
				ne(slots.id, slot.id),
				isNull(slots.cancelledAt),
				lt(slots.startsAt, slot.endsAt),
				gt(slots.endsAt, slot.startsAt)
			)
		)
		.orderBy(asc(slots.startsAt))
		.limit(1);
	return row ?? null;
}
