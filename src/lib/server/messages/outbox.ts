import { and, asc, eq, isNull, lt, lte, or } from 'drizzle-orm';
import { db, write } from '../db';
import { outboxMessages } from '../db/schema';
import { nextAttempt } from './retry';

export type Queued = typeof outboxMessages.$inferSelect;

/** A claim older than this was left by a process that died; its message is sent again. */
const claimLastsMs = 2 * 60_000;

const due = (now: number) =>
	and(
		isNull(outboxMessages.sentAt),
		isNull(outboxMessages.failedAt),
		lte(outboxMessages.nextAttemptAt, now),
		or(isNull(outboxMessages.claimedAt), lt(outboxMessages.claimedAt, now - claimLastsMs))
	);

/** Takes up to `most` messages that are due, oldest first, so that nobody else sends them. */
export async function claimDue(now: number, most: number): Promise<Queued[]> {
	const waiting = await db
		.select({ id: outboxMessages.id })
		.from(outboxMessages)
		.where(due(now))
		.orderBy(asc(outboxMessages.id))
		.limit(most);
	if (waiting.length === 0) return [];
	return write(async (tx) => {
		const claimed: Queued[] = [];
		for (const { id } of waiting) {
			const [row] = await tx
				.update(outboxMessages)
				.set({ claimedAt: now })
				.where(and(eq(outboxMessages.id, id), due(now)))
				.returning();
			if (row) claimed.push(row);
		}
		return claimed;
	});
}

export async function markSent(id: number, now: number): Promise<void> {
	await write((tx) =>
		tx
			.update(outboxMessages)
			.set({ sentAt: now, claimedAt: null, lastError: null })
			.where(eq(outboxMessages.id, id))
	);
}

/** Puts a message back for later, or gives up on it when the fault is final or after the last wait. */
export async function markFailed(
	message: Queued,
	fault: { reason: string; isFinal: boolean },
	now: number
): Promise<void> {
	const attempts = message.attempts + 1;
	const next = fault.isFinal ? null : nextAttempt(attempts, now);
	await write((tx) =>
		tx
			.update(outboxMessages)
			.set({
				attempts,
				claimedAt: null,
				lastError: fault.reason.slice(0, 500),
				...(next === null ? { failedAt: now } : { nextAttemptAt: next })
			})
			.where(eq(outboxMessages.id, message.id))
	);
}
