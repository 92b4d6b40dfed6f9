import { and, asc, eq, gt, inArray, isNull, lt } from 'drizzle-orm';
import type { SessionContent } from '$lib/domain/training';
import { db, type Queryable } from '../db';
import { bookings, classTypes, sessionRevisions, slots, type BookingStatus } from '../db/schema';
import type { PlanSlot } from '../kit/plan';

/** Statuses that take a place and claim kit. */
export const inStatuses = [
	'held',
	'booked',
	'attended',
	'no-show'
] as const satisfies BookingStatus[];

/**
 * The uncancelled slots that touch the time from `fromAt` until just before `toAt`, with the
 * people in them, as the kit rules need them.
 */
export async function planSlotsBetween(
	fromAt: number,
	toAt: number,
	q: Queryable = db
): Promise<PlanSlot[]> {
	const during = and(lt(slots.startsAt, toAt), gt(slots.endsAt, fromAt), isNull(slots.cancelledAt));
	const [rows, people] = await Promise.all([
		q
			.select({
				id: slots.id,
				startsAt: slots.startsAt,
				endsAt: slots.endsAt,
				roomId: slots.roomId,
				revisionId: slots.sessionRevisionId,
				defaultClaims: classTypes.defaultClaims
			})
			.from(slots)
			.innerJoin(classTypes, eq(classTypes.id, slots.classTypeId))
			.where(and(during, gt(slots.startsAt, fromAt - longestMs)))
			.orderBy(asc(slots.startsAt), asc(slots.id)),
		q
			.select({
				bookingId: bookings.id,
				slotId: bookings.slotId,
				variations: bookings.variations,
				loads: bookings.loads
			})
			.from(bookings)
			.innerJoin(slots, eq(slots.id, bookings.slotId))
			.where(
				and(
					during,
					gt(slots.startsAt, fromAt - longestMs),
					inArray(bookings.status, [...inStatuses])
				)
			)
			.orderBy(asc(bookings.id))
	]);
	const contents = await revisionContents(rows.flatMap(({ revisionId }) => revisionId ?? []));
	const peopleOf = new Map<number, PlanSlot['people']>(rows.map(({ id }) => [id, []]));
	for (const { slotId, bookingId, variations, loads } of people) {
		peopleOf.get(slotId)?.push({ bookingId, choices: { variations, loads } });
	}
	return rows.map(({ revisionId, ...row }) => ({
		...row,
		content: revisionId === null ? null : (contents.get(revisionId) ?? null),
		people: peopleOf.get(row.id)!
	}));
}

/** Slots last twelve hours at most (check `slots_order`): the index on starts can bound the search. */
const longestMs = 12 * 3_600_000;

/** Committed revisions never change, so what was read once is kept; by database, for tests. */
const keptContents = new WeakMap<object, Map<number, SessionContent>>();

export async function revisionContents(ids: number[]): Promise<Map<number, SessionContent>> {
	const kept = keptContents.get(db) ?? new Map<number, SessionContent>();
	keptContents.set(db, kept);
	const missing = [...new Set(ids)].filter((id) => !kept.has(id));
	if (missing.length > 0) {
		const rows = await db
			.select({ id: sessionRevisions.id, content: sessionRevisions.content })
			.from(sessionRevisions)
			.where(inArray(sessionRevisions.id, missing));
		for (const { id, content } of rows) kept.set(id, content);
	}
	return kept;
}
