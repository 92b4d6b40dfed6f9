import { and, eq } from 'drizzle-orm';
import { places, type Places } from '$lib/domain/kit';
import { refuse, type Refused } from '$lib/domain/refusal';
import {
	keepChoices,
	secondsPerRep,
	sessionPlan,
	stationsOf,
	type SessionContent
} from '$lib/domain/training';
import type { LayDraft } from '$lib/forms/lay';
import { db, type Queryable } from '../db';
import { sessionRevisions, trainingSessions } from '../db/schema';
import { kitRegister } from '../kit/in-service';
import { library, type Library } from '../kit/library';
import { clustersOf, problemOf, type PlanSlot } from '../kit/plan';
import { choicesOn, type Choosing } from './choices';
import { limitsOfSlots } from './limits';
import { loadSlotsById, type SlotWithCoaches } from './load';
import { limitsOf } from './places';
import { planSlotsBetween } from './plan-slots';
import { filled } from './shortages';

/** A booking whose choices fall to as written, wholly or in part. */
export type Losing = {
	bookingId: number;
	personId: number;
	name: string;
	kept: Choosing['choices'];
};

/** What laying does to one slot. */
export type LayingRow = {
	slot: SlotWithCoaches;
	/** "4 min over"; null where the session fits. */
	over: string | null;
	/** How many the slot takes then, and what decides it. */
	places: Places;
	/** The instant that its bottleneck's seconds count from. */
	clockAt: number;
	/** People whose choices are no longer there. */
	loses: Losing[];
};

export type Laying = {
	session: { id: number; title: string; revisionId: number } | null;
	content: SessionContent | null;
	rows: LayingRow[];
};

export type LayingRefusal = Refused<
	| 'not-found'
	| 'already-ran'
	| 'slot-cancelled'
	| 'session-archived'
	| 'session-refused'
	| 'no-slots'
>;

/** Works out what laying a session's current revision on slots does, or taking off what is laid. Writes nothing. */
export async function planLaying(
	{ slots: slotIds, session: sessionId }: Pick<LayDraft, 'slots' | 'session'>,
	{ now }: { now: number },
	q: Queryable = db
): Promise<{ ok: true; laying: Laying } | LayingRefusal> {
	const slots = await loadSlotsById(slotIds, q);
	if (slots.length === 0) return refuse('no-slots');
	if (slots.length < new Set(slotIds).size) return refuse('not-found');
	if (slots.some(({ cancelledAt }) => cancelledAt !== null)) return refuse('slot-cancelled');
	if (slots.some(({ startsAt }) => startsAt <= now)) return refuse('already-ran');
	const lib = await library(q);
	const found = sessionId === undefined ? nothing : await currentRevision(sessionId, lib, q);
	if (!found.ok) return found;
	const { session, content } = found;

	const placed = await placesThen(slots, content, lib, q);
	const chosen = await choicesOn(slotIds, q);
	const rows = slots.map((slot) => ({
		slot,
		over: content ? sessionPlan(content, lengthS(slot), secondsPerRep(lib.rules)).said : null,
		...placed.get(slot.id)!,
		loses: chosen.filter(({ slotId }) => slotId === slot.id).flatMap(losing(content, lib))
	}));
	return { ok: true, laying: { session, content, rows } };
}

const lengthS = ({ startsAt, endsAt }: SlotWithCoaches) => (endsAt - startsAt) / 1000;

const nothing = { ok: true as const, session: null, content: null };

async function currentRevision(id: number, lib: Library, q: Queryable) {
	const [row] = await q
		.select({
			id: trainingSessions.id,
			title: trainingSessions.title,
			archivedAt: trainingSessions.archivedAt,
			revisionId: sessionRevisions.id,
			content: sessionRevisions.content
		})
		.from(trainingSessions)
		.innerJoin(
			sessionRevisions,
			and(
				eq(sessionRevisions.trainingSessionId, trainingSessions.id),
				eq(sessionRevisions.number, trainingSessions.revisionNumber)
			)
		)
		.where(eq(trainingSessions.id, id));
	if (!row) return refuse('not-found');
	if (row.archivedAt !== null) return refuse('session-archived');
	if (!stationsOf(row.content, lib.rules).ok) return refuse('session-refused');
	const { revisionId, title, content } = row;
	return { ok: true as const, session: { id, title, revisionId }, content };
}

/** Each slot's places with the session on all of them, beside the others at their planned places. */
async function placesThen(
	slots: SlotWithCoaches[],
	content: SessionContent | null,
	lib: Library,
	q: Queryable
): Promise<Map<number, Pick<LayingRow, 'places' | 'clockAt'>>> {
	const fromAt = Math.min(...slots.map(({ startsAt }) => startsAt));
	const toAt = Math.max(...slots.map(({ endsAt }) => endsAt));
	const asked = new Set(slots.map(({ id }) => id));
	const around = (await planSlotsBetween(fromAt, toAt, q)).map((slot) =>
		asked.has(slot.id) ? { ...slot, content } : slot
	);
	const register = await kitRegister(fromAt, toAt, q);
	const limits = await limitsOfSlots(
		around.map(({ id }) => id),
		q
	);
	const found = new Map<number, Pick<LayingRow, 'places' | 'clockAt'>>();
	for (const cluster of clustersOf<PlanSlot>(around)) {
		const ofCluster = cluster.filter(({ id }) => asked.has(id));
		if (ofCluster.length === 0) continue;
		const problem = filled(problemOf(cluster, lib, register), cluster, limits);
		for (const { id } of ofCluster) {
			const ask = { slotId: String(id), limits: limitsOf(limits.get(id)!) };
			found.set(id, { places: places(problem, ask), clockAt: cluster[0]!.startsAt });
		}
	}
	return found;
}

const losing =
	(content: SessionContent | null, lib: Library) =>
	({ bookingId, personId, name, choices }: Choosing): Losing[] => {
		const { kept, dropped } = keepChoices(choices, content ?? { blocks: [] }, lib.rules);
		return dropped.length > 0 ? [{ bookingId, personId, name, kept }] : [];
	};
