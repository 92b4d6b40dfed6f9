import { inArray, sql } from 'drizzle-orm';
import { refuse, type Refused } from '$lib/domain/refusal';
import { audit } from '../audit/record';
import { release } from '../bookings/release';
import { write, type Tx } from '../db';
import { slots } from '../db/schema';
import type { Viewer } from '../guard';
import { currentGym, type Gym } from '../gym/queries';
import { affectedBy, type AffectedSlot } from './affected';
import { loadSlot } from './load';
import { lookFirst, type Confirmed, type LookFirst } from './look';
import { tellPeople } from './tell';

/** Calls off one slot: whoever does it sees first who counts on it, and those people are told. */
export async function callOff(
	viewer: Viewer,
	slotId: number,
	{ why, now, ...confirmed }: Confirmed & { why: string; now: number }
): Promise<
	| { ok: true; released: number }
	| Refused<'not-found' | 'no-gym' | 'already-ran' | 'slot-cancelled'>
	| LookFirst
> {
	return write(async (tx) => {
		const [gym, slot] = [await currentGym(tx), await loadSlot(slotId, tx)];
		if (!gym) return refuse('no-gym');
		if (!slot) return refuse('not-found');
		if (slot.cancelledAt !== null) return refuse('slot-cancelled');
		if (slot.startsAt <= now) return refuse('already-ran');
		const affected = await affectedBy([{ slotId, becomes: { what: 'called-off' } }], tx);
		const look = lookFirst(affected, [], confirmed);
		if (look) return look;
		const fact = `slot:${slotId}:called-off:${slot.sequence + 1}`;
		const released = await callOffSlots(tx, viewer, affected, { gym, why, fact, now });
		await audit(tx, {
			viewer,
			verb: 'slots.call-off',
			noun: 'slots',
			nounId: slotId,
			now,
			detail: { why, released }
		});
		return { ok: true, released };
	});
}

/**
 * Calls off the slots given: marks them, gives every booking and credit back, queues a letter to
 * each person. The caller asked them to look first, and writes the audit log.
 * @returns how many bookings were released
 */
export async function callOffSlots(
	tx: Tx,
	viewer: Viewer,
	affected: readonly AffectedSlot[],
	{ gym, why, fact, now }: { gym: Gym; why: string; fact: string; now: number }
): Promise<number> {
	const slotIds = affected.map(({ slotId }) => slotId);
	if (slotIds.length === 0) return 0;
	await tx
		.update(slots)
		.set({
			cancelledAt: now,
			cancelledById: viewer.personId,
			cancelReason: why,
			sequence: sql`${slots.sequence} + 1`,
			modifiedAt: now
		})
		.where(inArray(slots.id, slotIds));
	const counting = affected.flatMap(({ people }) => people);
	for (const { bookingId, status } of counting) {
		await release(tx, { id: bookingId, status }, { now, byId: viewer.personId, why });
	}
	await tellPeople(tx, affected, { gym, why, fact, now });
	return counting.length;
}
