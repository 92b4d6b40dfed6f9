import { and, asc, desc, eq, gt, isNull, sql } from 'drizzle-orm';
import { secondsPerRep, type SessionContent } from '$lib/domain/training';
import { db } from '../db';
import { people, programmes, rooms, sessionRevisions, slots, trainingSessions } from '../db/schema';
import { inServiceDuring, kitRegister } from '../kit/in-service';
import { library } from '../kit/library';
import { blocksOf, type SlotBlock } from '../slots/queries';

export type SessionCard = {
	id: number;
	title: string;
	aim: string;
	lengthMin: number;
	programme: string | null;
	number: number;
	blocks: SlotBlock[];
	/** Classes ahead on which some revision of it is laid. */
	ahead: number;
	lastOn: string | null;
};

/** The shelf: every session that is not archived, by programme and title. */
export async function sessionCards({ now }: { now: number }): Promise<SessionCard[]> {
	const rows = await db
		.select({
			id: trainingSessions.id,
			title: trainingSessions.title,
			lengthMin: trainingSessions.lengthMin,
			programme: programmes.name,
			number: trainingSessions.revisionNumber,
			content: sessionRevisions.content,
			ahead: sql<number>`(select count(*) from slots s join session_revisions r on r.id = s.session_revision_id where r.training_session_id = training_sessions.id and s.starts_at > ${now} and s.cancelled_at is null)`,
			lastOn: sql<
				string | null
			>`(select max(s.starts_on) from slots s join session_revisions r on r.id = s.session_revision_id where r.training_session_id = training_sessions.id and s.starts_at <= ${now})`
		})
		.from(trainingSessions)
		.innerJoin(
			sessionRevisions,
			and(
				eq(sessionRevisions.trainingSessionId, trainingSessions.id),
				eq(sessionRevisions.number, trainingSessions.revisionNumber)
			)
		)
		.leftJoin(programmes, eq(programmes.id, trainingSessions.programmeId))
		.where(isNull(trainingSessions.archivedAt))
		.orderBy(asc(programmes.position), asc(trainingSessions.title));
	const perRep = secondsPerRep((await library()).rules);
	return rows.map(({ content, lengthMin, ...row }) => ({
		...row,
		lengthMin,
		aim: content.aim,
		blocks: blocksOf(content, lengthMin * 60_000, perRep)
	}));
}

export type OpenSession = {
	id: number;
	title: string;
	lengthMin: number;
	programmeId: number | null;
	number: number;
	content: SessionContent;
	/** Revisions, the newest first. */
	revisions: { number: number; at: number; by: string | null }[];
	/** Classes ahead with an older revision of it. */
	olderAhead: { slots: number; firstOn: string | null };
};

/** One session at a revision; the current one unless a number is given. */
export async function openSession(
	id: number,
	{ now, number }: { now: number; number?: number }
): Promise<OpenSession | null> {
	const row = await db
		.select()
		.from(trainingSessions)
		.where(and(eq(trainingSessions.id, id), isNull(trainingSessions.archivedAt)))
		.get();
	if (!row) return null;
	const [revisions, [older]] = await Promise.all([
		db
			.select({
				number: sessionRevisions.number,
				at: sessionRevisions.createdAt,
				by: people.name,
				content: sessionRevisions.content
			})
			.from(sessionRevisions)
			.leftJoin(people, eq(people.id, sessionRevisions.createdById))
			.where(eq(sessionRevisions.trainingSessionId, id))
			.orderBy(desc(sessionRevisions.number)),
		db
			.select({ slots: sql<number>`count(*)`, firstOn: sql<string | null>`min(${slots.startsOn})` })
			.from(slots)
			.innerJoin(sessionRevisions, eq(sessionRevisions.id, slots.sessionRevisionId))
			.where(
				and(
					eq(sessionRevisions.trainingSessionId, id),
					gt(slots.startsAt, now),
					isNull(slots.cancelledAt),
					sql`${sessionRevisions.number} < ${row.revisionNumber}`
				)
			)
	]);
	const shown = revisions.find((revision) => revision.number === (number ?? row.revisionNumber));
	if (!shown) return null;
	return {
		id,
		title: row.title,
		lengthMin: row.lengthMin,
		programmeId: row.programmeId,
		number: row.revisionNumber,
		content: shown.content,
		revisions: revisions.map(({ number: n, at, by }) => ({ number: n, at, by })),
		olderAhead: older ?? { slots: 0, firstOn: null }
	};
}

/** What the editor needs to count in the browser: movements, kit in service now, rooms, programmes. */
export async function workshop({ now }: { now: number }) {
	const [lib, register, roomRows, programmeRows] = await Promise.all([
		library(),
		kitRegister(now, now + 1),
		db
			.select({ id: rooms.id, name: rooms.name, places: rooms.places })
			.from(rooms)
			.where(isNull(rooms.archivedAt))
			.orderBy(asc(rooms.position), asc(rooms.name)),
		db
			.select({ id: programmes.id, name: programmes.name })
			.from(programmes)
			.where(isNull(programmes.archivedAt))
			.orderBy(asc(programmes.position))
	]);
	return {
		movements: Object.values(lib.movements).map(
			({ id, name, pattern, perSide, secondsPerRep: seconds, ladder }) => ({
				id,
				name,
				pattern,
				perSide,
				secondsPerRep: seconds,
				ladder
			})
		),
		groups: lib.groups,
		loadedGroups: [...lib.loadedGroups],
		kit: inServiceDuring(register, lib, now, now + 1),
		rooms: roomRows,
		programmes: programmeRows
	};
}
export type Workshop = Awaited<ReturnType<typeof workshop>>;
