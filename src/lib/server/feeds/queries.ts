import { and, asc, eq, gte, inArray, isNotNull, isNull, lt, or, sql } from 'drizzle-orm';
import { db, write } from '../db';
import {
	bookings,
	classTypes,
	feeds,
	people,
	rooms,
	sessionRevisions,
	slotCoaches,
	slots,
	trainingSessions
} from '../db/schema';
import { hashOf } from './token';

export type FeedRow = {
	id: number;
	kind: 'member' | 'coach' | 'public';
	name: string;
	createdAt: number;
	lastReadAt: number | null;
};

/** The calendar addresses that somebody made and that still answer. */
export const feedsOf = (personId: number): Promise<FeedRow[]> =>
	db
		.select({
			id: feeds.id,
			kind: feeds.kind,
			name: feeds.name,
			createdAt: feeds.createdAt,
			lastReadAt: feeds.lastReadAt
		})
		.from(feeds)
		.where(and(eq(feeds.createdById, personId), isNull(feeds.revokedAt)))
		.orderBy(asc(feeds.id));

/** The feed that a token opens; null for a wrong or revoked one, and for a shut account. */
export async function feedByToken(token: string) {
	const [row] = await db
		.select({
			id: feeds.id,
			kind: feeds.kind,
			personId: feeds.personId,
			lastReadAt: feeds.lastReadAt
		})
		.from(feeds)
		.leftJoin(people, eq(people.id, feeds.personId))
		.where(
			and(eq(feeds.tokenHash, hashOf(token)), isNull(feeds.revokedAt), isNull(people.disabledAt))
		);
	return row ?? null;
}

const hourMs = 3_600_000;

/** Notes that a feed was read, once an hour at most: readers poll. */
export async function noteReading(
	feed: { id: number; lastReadAt: number | null },
	now: number
): Promise<void> {
	if (feed.lastReadAt !== null && now - feed.lastReadAt < hourMs) return;
	await write((tx) => tx.update(feeds).set({ lastReadAt: now }).where(eq(feeds.id, feed.id)));
}

export type FeedEntry = {
	id: number;
	uid: string;
	startsAt: number;
	endsAt: number;
	title: string;
	room: string;
	coaches: string | null;
	cancelledAt: number | null;
	sequence: number;
	createdAt: number;
	modifiedAt: number;
};

/**
 * What a feed carries from `fromAt` until just before `toAt`: classes called off stay, as cancelled.
 * Each once, also for whoever booked it again after it came back.
 */
export async function entriesOf(
	feed: { kind: 'member' | 'coach' | 'public'; personId: number | null },
	fromAt: number,
	toAt: number
): Promise<FeedEntry[]> {
	const during = and(gte(slots.startsAt, fromAt), lt(slots.startsAt, toAt));
	const mine = and(
		eq(bookings.slotId, slots.id),
		eq(bookings.personId, feed.personId ?? 0),
		or(
			inArray(bookings.status, ['held', 'booked', 'attended']),
			and(eq(bookings.status, 'released'), isNotNull(slots.cancelledAt))
		)
	);
	const rows = db
		.selectDistinct({
			id: slots.id,
			uid: slots.uid,
			startsAt: slots.startsAt,
			endsAt: slots.endsAt,
			title: sql<string>`case when ${slots.sessionPublishedAt} is not null then coalesce(${trainingSessions.title}, ${classTypes.name}) else ${classTypes.name} end`,
			room: rooms.name,
			coaches: sql<
				string | null
			>`(select group_concat(p.name, ', ') from slot_coaches c join people p on p.id = c.person_id where c.slot_id = slots.id)`,
			cancelledAt: slots.cancelledAt,
			sequence: slots.sequence,
			createdAt: slots.createdAt,
			modifiedAt: slots.modifiedAt
		})
		.from(slots)
		.innerJoin(classTypes, eq(classTypes.id, slots.classTypeId))
		.innerJoin(rooms, eq(rooms.id, slots.roomId))
		.leftJoin(sessionRevisions, eq(sessionRevisions.id, slots.sessionRevisionId))
		.leftJoin(trainingSessions, eq(trainingSessions.id, sessionRevisions.trainingSessionId))
		.$dynamic();
	if (feed.kind === 'member') rows.innerJoin(bookings, mine);
	if (feed.kind === 'coach') {
		rows.innerJoin(
			slotCoaches,
			and(eq(slotCoaches.slotId, slots.id), eq(slotCoaches.personId, feed.personId ?? 0))
		);
	}
	return rows.where(during).orderBy(asc(slots.startsAt), asc(slots.id));
}
