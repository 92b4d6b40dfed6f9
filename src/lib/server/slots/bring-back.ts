import { eq, sql } from 'drizzle-orm';
import { refuse, type Refused } from '$lib/domain/refusal';
import { audit } from '../audit/record';
import { isClosedOn } from '$lib/domain/calendar/closures';
import { closedDays } from '../closures/queries';
import { write, type Tx } from '../db';
import { slots } from '../db/schema';
import type { Viewer } from '../guard';
import { clashesOf } from './clashes';
import { loadSlot, type SlotWithCoaches } from './load';
import { lookFirst, type Confirmed, type LookFirst } from './look';
import { recordOverrides } from './overrides';

/**
 * Puts a slot that was called off back on the timetable, before it was to start. Its bookings
 * were released and people told, so the places are open anew.
 */
export async function bringBack(
	viewer: Viewer,
	slotId: number,
	{ now, ...confirmed }: Confirmed & { now: number }
): Promise<
	{ ok: true } | Refused<'not-found' | 'already-ran' | 'slot-stands' | 'closed-day'> | LookFirst
> {
	return write(async (tx) => {
		const slot = await loadSlot(slotId, tx);
		if (!slot) return refuse('not-found');
		if (slot.cancelledAt === null) return refuse('slot-stands');
		if (slot.startsAt <= now) return refuse('already-ran');
		if (isClosedOn(await closedDays(tx), slot.startsOn, slot.roomId)) return refuse('closed-day');
		const clashes = await clashesOf([{ ...slot, slotId }], tx);
		const look = lookFirst([], clashes, confirmed);
		if (look) return look;
		const why = confirmed.overrideWhy ?? '';
		await recordOverrides(tx, clashes, { why, byId: viewer.personId, now });
		await revive(tx, slot, now);
		await audit(tx, { viewer, verb: 'slots.bring-back', noun: 'slots', nounId: slotId, now });
		return { ok: true };
	});
}

/** Lets a slot stand again, under the same uid, for its calendars to notice. */
export async function revive(tx: Tx, slot: SlotWithCoaches, now: number): Promise<void> {
	await tx
		.update(slots)
		.set({
			cancelledAt: null,
			cancelledById: null,
			cancelReason: null,
			sequence: sql`${slots.sequence} + 1`,
			modifiedAt: now
		})
		.where(eq(slots.id, slot.id));
}
