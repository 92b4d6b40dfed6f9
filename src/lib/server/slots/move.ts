import { eq, inArray, sql } from 'drizzle-orm';
import type { Tx } from '../db';
import { slotCoaches, slots } from '../db/schema';

/** A slot's new standing, and whatever else of its row changes with it. */
export type Move = {
	slotId: number;
	columns: Partial<typeof slots.$inferInsert>;
	/** Lead coach first; left out where they stay. */
	coachIds?: readonly number[];
};

/**
 * Writes where slots stand from now on and tells their calendars. All leave their old place
 * before any takes its new one, so that slots which trade places do not meet on the way.
 */
export async function moveSlots(tx: Tx, moves: readonly Move[], now: number): Promise<void> {
	const ids = moves.map(({ slotId }) => slotId);
	if (ids.length === 0) return;
	await tx.update(slots).set({ cancelledAt: now }).where(inArray(slots.id, ids));
	const recoached = moves.filter(({ coachIds }) => coachIds !== undefined);
	await tx.delete(slotCoaches).where(
		inArray(
			slotCoaches.slotId,
			recoached.map(({ slotId }) => slotId)
		)
	);
	for (const { slotId, columns } of moves) {
		await tx
			.update(slots)
			.set({
				...columns,
				cancelledAt: null,
				sequence: sql`${slots.sequence} + 1`,
				modifiedAt: now
			})
			.where(eq(slots.id, slotId));
	}
	for (const { slotId, coachIds = [] } of recoached) {
		await tx
			.insert(slotCoaches)
			.values(coachIds.map((personId, position) => ({ slotId, personId, position })));
	}
}
