import { and, asc, eq, gt, inArray, isNull, lt } from 'drizzle-orm';
import { db, type Queryable } from '../db';
import { bookings, classTypes, people, rooms, slots } from '../db/schema';

/** Statuses in which somebody counts on the slot. */
export const countingOn = ['held', 'booked', 'waitlisted'] as const;

export type AffectedPerson = {
	bookingId: number;
	personId: number;
	name: string;
	email: string | null;
	status: (typeof countingOn)[number];
	/** Another class that they hold a place in at the time that this one moves to. */
	elsewhere: string | null;
};

/** A slot that changes, and who counts on it. */
export type AffectedSlot = {
	slotId: number;
	title: string;
	room: string;
	startsAt: number;
	endsAt: number;
	/** What becomes of it. */
	becomes: Becomes;
	people: AffectedPerson[];
};

/** `called-off`, or where and when it stands afterwards; null where that stays. */
export type Becomes =
	| { what: 'called-off' }
	| { what: 'changed'; startsAt: number; endsAt: number; room: string | null; coaches: boolean }
	| { what: 'laid'; loses: number[] }
	| { what: 'fewer-places'; places: number };

/** The slots in question with the people who count on them, waitlist in its order; slots without anybody too. */
export async function affectedBy(
	changes: readonly { slotId: number; becomes: Becomes }[],
	q: Queryable = db
): Promise<AffectedSlot[]> {
	if (changes.length === 0) return [];
	const ids = changes.map(({ slotId }) => slotId);
	const rows = await q
		.select({
			slotId: slots.id,
			title: classTypes.name,
			room: rooms.name,
			startsAt: slots.startsAt,
			endsAt: slots.endsAt
		})
		.from(slots)
		.innerJoin(classTypes, eq(classTypes.id, slots.classTypeId))
		.innerJoin(rooms, eq(rooms.id, slots.roomId))
		.where(inArray(slots.id, ids))
		.orderBy(asc(slots.startsAt), asc(slots.id));
	const who = await peopleOn(ids, q);
	await findElsewhere(changes, who, q);
	const becomes = new Map(changes.map((change) => [change.slotId, change.becomes]));
	return rows.map((row) => ({
		...row,
		becomes: becomes.get(row.slotId) ?? { what: 'called-off' },
		people: who.get(row.slotId) ?? []
	}));
}

async function peopleOn(slotIds: number[], q: Queryable): Promise<Map<number, AffectedPerson[]>> {
	const rows = await q
		.select({
			slotId: bookings.slotId,
			bookingId: bookings.id,
			personId: people.id,
			name: people.name,
			email: people.email,
			status: bookings.status
		})
		.from(bookings)
		.innerJoin(people, eq(people.id, bookings.personId))
		.where(and(inArray(bookings.slotId, slotIds), inArray(bookings.status, [...countingOn])))
		.orderBy(asc(bookings.id));
	const bySlot = new Map<number, AffectedPerson[]>();
	for (const { slotId, status, ...person } of rows) {
		const counted = { ...person, status: status as AffectedPerson['status'], elsewhere: null };
		bySlot.set(slotId, [...(bySlot.get(slotId) ?? []), counted]);
	}
	return bySlot;
}

/** Bookings of one person may touch but not overlap: a move that makes them overlap is shown. */
async function findElsewhere(
	changes: readonly { slotId: number; becomes: Becomes }[],
	who: Map<number, AffectedPerson[]>,
	q: Queryable
): Promise<void> {
	const moves = changes.flatMap(({ slotId, becomes }) =>
		becomes.what === 'changed' && who.has(slotId) ? [{ slotId, ...becomes }] : []
	);
	if (moves.length === 0) return;
	const personIds = moves.flatMap(({ slotId }) => who.get(slotId)!.map((p) => p.personId));
	const others = await q
		.select({
			slotId: slots.id,
			personId: bookings.personId,
			title: classTypes.name,
			startsAt: slots.startsAt,
			endsAt: slots.endsAt
		})
		.from(bookings)
		.innerJoin(slots, eq(slots.id, bookings.slotId))
		.innerJoin(classTypes, eq(classTypes.id, slots.classTypeId))
		.where(
			and(
				inArray(bookings.personId, [...new Set(personIds)]),
				inArray(bookings.status, [...countingOn]),
				isNull(slots.cancelledAt),
				gt(slots.endsAt, Math.min(...moves.map(({ startsAt }) => startsAt))),
				lt(slots.startsAt, Math.max(...moves.map(({ endsAt }) => endsAt)))
			)
		);
	const moved = new Set(moves.map(({ slotId }) => slotId));
	for (const move of moves) {
		for (const person of who.get(move.slotId)!) {
			const other = others.find(
				(o) =>
					o.personId === person.personId &&
					!moved.has(o.slotId) &&
					o.startsAt < move.endsAt &&
					o.endsAt > move.startsAt
			);
			person.elsewhere = other?.title ?? null;
		}
	}
}
