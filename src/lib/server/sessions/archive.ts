import { and, eq, isNull } from 'drizzle-orm';
import { refuse, type Refused } from '$lib/domain/refusal';
import { audit } from '../audit/record';
import { write } from '../db';
import { trainingSessions } from '../db/schema';
import type { Viewer } from '../guard';

/** Takes a session off the shelf; where it is laid it stays, and its revisions with it. */
export function archiveSession(
	viewer: Pick<Viewer, 'personId'>,
	sessionId: number,
	{ now }: { now: number }
): Promise<{ ok: true } | Refused<'not-found'>> {
	return write(async (tx) => {
		const gone = await tx
			.update(trainingSessions)
			.set({ archivedAt: now })
			.where(and(eq(trainingSessions.id, sessionId), isNull(trainingSessions.archivedAt)))
			.returning({ id: trainingSessions.id });
		if (gone.length === 0) return refuse('not-found');
		const fact = { viewer, verb: 'sessions.archive', noun: 'training_sessions', nounId: sessionId };
		await audit(tx, { ...fact, now });
		return { ok: true };
	});
}
