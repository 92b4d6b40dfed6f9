import { and, asc, eq, gt, inArray, isNull } from 'drizzle-orm';
import { promoteNext } from '../bookings/promote';
import { slotFacts } from '../bookings/slot-facts';
import type { Tx } from '../db';
import { bookings, slots } from '../db/schema';
import type { Viewer } from '../guard';

type By = { viewer: Pick<Viewer, 'personId'>; now: number };

/** Gives places that a change opened to those who wait, slot by slot. */
export async function promoteWaiting(
	tx: Tx,
	slotIds: readonly number[],
	{ viewer, now }: By
): Promise<void> {
	for (const slotId of slotIds) {
		const slot = await slotFacts(tx, slotId);
		if (slot) await promoteNext(tx, slot, { now, byId: viewer.personId });
	}
}

/** The same for every slot ahead in a room where somebody waits. */
export async function promoteWaitingIn(tx: Tx, roomId: number, by: By): Promise<void> {
	const waiting = await tx
		.selectDistinct({ id: slots.id, startsAt: slots.startsAt })
		.from(slots)
		.innerJoin(bookings, eq(bookings.slotId, slots.id))
		.where(
			and(
				eq(slots.roomId, roomId),
				gt(slots.startsAt, by.now),
				isNull(slots.cancelledAt),
				inArray(bookings.status, ['waitlisted'])
			)
		)
		.orderBy(asc(slots.startsAt));
	await promoteWaiting(
		tx,
		waiting.map(({ id }) => id),
		by
	);
}
