import { and, asc, eq, gt, inArray, isNull, lt } from 'drizzle-orm';
import type { Tx } from '../db';
import { prepared } from '../db/prepared';
import { bookings, classTypes, people, slots } from '../db/schema';
import { longestMs } from '../slots/plan-slots';
import type { SlotFacts } from './slot-facts';

/** What a booking command must know of who books, beside their passes. */
export type PersonFacts = {
	/** Their booking of the slot itself, live or marked absent. */
	bookingId: number | null;
	/** The class of a live booking that runs at the same time; touching is no overlap. */
	overlapping: string | null;
};

const standing = ['held', 'booked', 'waitlisted', 'attended', 'no-show'] as const;

/** A person with each class that runs from `fromAt` to `toAt`, and their booking of it where there is one. */
const bookingsDuring = prepared<{
	personId: number;
	fromAt: number;
	toAt: number;
	after: number;
}>()((q, at) =>
	q
		.select({
			slotId: slots.id,
			className: classTypes.name,
			bookingId: bookings.id,
			status: bookings.status
		})
		.from(people)
		.leftJoin(
			slots,
			and(
				isNull(slots.cancelledAt),
				lt(slots.startsAt, at('toAt')),
				gt(slots.startsAt, at('after')),
				gt(slots.endsAt, at('fromAt'))
			)
		)
		.leftJoin(classTypes, eq(classTypes.id, slots.classTypeId))
		.leftJoin(
			bookings,
			and(
				eq(bookings.slotId, slots.id),
				eq(bookings.personId, people.id),
				inArray(bookings.status, [...standing])
			)
		)
		.where(and(eq(people.id, at('personId')), isNull(people.disabledAt)))
		.orderBy(asc(slots.startsAt))
);

/** Null where there is no such person, or they may no longer sign in. */
export async function personFacts(
	tx: Tx,
	personId: number,
	slot: Pick<SlotFacts, 'id' | 'startsAt' | 'endsAt'>
): Promise<PersonFacts | null> {
	const { startsAt: fromAt, endsAt: toAt } = slot;
	const rows = await bookingsDuring(tx, { personId, fromAt, toAt, after: fromAt - longestMs });
	if (rows.length === 0) return null;
	const theirs = rows.filter(({ bookingId }) => bookingId !== null);
	const others = theirs.filter((b) => b.slotId !== slot.id && b.status !== 'no-show');
	return {
		bookingId: theirs.find(({ slotId }) => slotId === slot.id)?.bookingId ?? null,
		overlapping: others[0]?.className ?? null
	};
}
