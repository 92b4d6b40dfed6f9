import { and, eq, isNull, sql } from 'drizzle-orm';
import { refuse, type Refused } from '$lib/domain/refusal';
import {
	readSession,
	stationsOf,
	type SessionContent,
	type SessionFault
} from '$lib/domain/training';
import { audit } from '../audit/record';
import { db, write, type Tx } from '../db';
import { kitItems, people, sessionRevisions, trainingSessions } from '../db/schema';
import type { Viewer } from '../guard';
import { library } from '../kit/library';

export type SessionDraft = {
	/** As typed: checked here. */
	content: unknown;
	lengthMin: number;
	programmeId: number | null;
	/** The revision that was open when the typing began. */
	basedOn: number;
	/** Saves on top of somebody else's revision all the same. */
	overwrite?: boolean;
	now: number;
};

type Saved = { ok: true; sessionId: number; number: number };
type Actor = Pick<Viewer, 'personId'>;
export type SaveRefusal =
	| (Refused<'session-malformed'> & { faults: SessionFault[] })
	| Refused<
			'not-found' | 'saved-meanwhile' | 'kit-nobody-has' | 'unknown-movement' | 'unknown-variation'
	  >;

/** Makes a session with its first revision. */
export function addSession(
	viewer: Actor,
	draft: Omit<SessionDraft, 'basedOn' | 'overwrite'>
): Promise<Saved | SaveRefusal> {
	return write(async (tx) => {
		const read = await readDraft(tx, draft.content);
		if (!read.ok) return read;
		const { lengthMin, programmeId, now } = draft;
		const [row] = await tx
			.insert(trainingSessions)
			.values({
				title: read.content.title,
				lengthMin,
				programmeId,
				revisionNumber: 1,
				createdAt: now,
				createdById: viewer.personId
			})
			.returning({ id: trainingSessions.id });
		await insertRevision(tx, viewer, row!.id, 1, read.content, now);
		return { ok: true, sessionId: row!.id, number: 1 };
	});
}

/**
 * Saves a session as a new revision; the older ones stay as they are. Refused as
 * `saved-meanwhile`, with who and which revision, when somebody saved since it was opened.
 */
export function saveSession(
	viewer: Actor,
	sessionId: number,
	draft: SessionDraft
): Promise<Saved | SaveRefusal> {
	return write(async (tx) => {
		const row = await tx
			.select()
			.from(trainingSessions)
			.where(and(eq(trainingSessions.id, sessionId), isNull(trainingSessions.archivedAt)))
			.get();
		if (!row) return refuse('not-found');
		if (row.revisionNumber !== draft.basedOn && !draft.overwrite) {
			return refuse('saved-meanwhile', await whoSaved(tx, sessionId, row.revisionNumber));
		}
		const read = await readDraft(tx, draft.content);
		if (!read.ok) return read;
		const { lengthMin, programmeId, now } = draft;
		const number = row.revisionNumber + 1;
		await tx
			.update(trainingSessions)
			.set({ title: read.content.title, lengthMin, programmeId, revisionNumber: number })
			.where(eq(trainingSessions.id, sessionId));
		await insertRevision(tx, viewer, sessionId, number, read.content, now);
		return { ok: true, sessionId, number };
	});
}

async function readDraft(
	tx: Tx,
	content: unknown
): Promise<{ ok: true; content: SessionContent } | SaveRefusal> {
	const read = readSession(content);
	if (!read.ok) return read;
	const lib = await library(db);
	const stations = stationsOf(read.content, lib.rules);
	if (!stations.ok) return stations;
	const owned = await tx
		.select({ group: kitItems.kitGroupId, n: sql<number>`sum(${kitItems.count})` })
		.from(kitItems)
		.where(isNull(kitItems.archivedAt))
		.groupBy(kitItems.kitGroupId);
	const has = new Set(owned.filter(({ n }) => n > 0).map(({ group }) => String(group)));
	for (const block of stations.blocks) {
		for (const { ladder, asWritten } of block.stations) {
			const lacking = ladder[asWritten]?.needs.find(({ group }) => !has.has(group));
			if (lacking)
				return refuse('kit-nobody-has', { kit: lib.groups[lacking.group]?.plural ?? '' });
		}
	}
	return read;
}

async function insertRevision(
	tx: Tx,
	viewer: Actor,
	trainingSessionId: number,
	number: number,
	content: SessionContent,
	now: number
): Promise<void> {
	const createdById = viewer.personId;
	await tx
		.insert(sessionRevisions)
		.values({ trainingSessionId, number, content, createdAt: now, createdById });
	await audit(tx, {
		viewer,
		verb: number === 1 ? 'sessions.add' : 'sessions.save',
		noun: 'training_sessions',
		nounId: trainingSessionId,
		now,
		detail: { number, title: content.title }
	});
}

async function whoSaved(tx: Tx, sessionId: number, number: number) {
	const last = await tx
		.select({ name: people.name })
		.from(sessionRevisions)
		.leftJoin(people, eq(people.id, sessionRevisions.createdById))
		.where(
			and(eq(sessionRevisions.trainingSessionId, sessionId), eq(sessionRevisions.number, number))
		)
		.get();
	return { who: last?.name ?? '', number };
}
