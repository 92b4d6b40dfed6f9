import { and, asc, eq, gt, inArray, isNull, lt, type Placeholder } from 'drizzle-orm';
import type { SessionContent } from '$lib/domain/training';
import { db, type Queryable } from '../db';
import { prepared } from '../db/prepared';
import { bookings, classTypes, sessionRevisions, slots, type BookingStatus } from '../db/schema';
import type { PlanSlot } from '../kit/plan';

/** Statuses that take a place and claim kit. */
export const inStatuses = [
	'held',
	'booked',
	'attended',
	'no-show'
] as const satisfies BookingStatus[];

type During = { fromAt: number; toAt: number; after: number };

/** Slots last twelve hours at most (check `slots_order`): the index on starts can bound the search. */
export const longestMs = 12 * 3_600_000;

const touching = (at: (name: keyof During) => Placeholder) =>
	and(
		lt(slots.startsAt, at('toAt')),
		gt(slots.startsAt, at('after')),
		gt(slots.endsAt, at('fromAt')),
		isNull(slots.cancelledAt)
	);

const slotsDuring = prepared<During>()((q, at) =>
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
		.where(touching(at))
		.orderBy(asc(slots.startsAt), asc(slots.id))
);

const peopleDuring = prepared<During>()((q, at) =>
	q
		.select({
			bookingId: bookings.id,
			slotId: bookings.slotId,
			variations: bookings.variations,
			loads: bookings.loads
		})
		.from(bookings)
		.innerJoin(slots, eq(slots.id, bookings.slotId))
		.where(and(touching(at), inArray(bookings.status, [...inStatuses])))
		.orderBy(asc(bookings.id))
);

/**
 * The uncancelled slots that touch the time from `fromAt` until just before `toAt`, with the
 * people in them, as the kit rules need them.
 */
export async function planSlotsBetween(
	fromAt: number,
	toAt: number,
	q: Queryable = db
): Promise<PlanSlot[]> {
	const during = { fromAt, toAt, after: fromAt - longestMs };
	const [rows, people] = await Promise.all([slotsDuring(q, during), peopleDuring(q, during)]);
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
