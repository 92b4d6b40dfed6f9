import { eq } from 'drizzle-orm';
import { localOf } from '$lib/domain/calendar/zone';
import { refuse, type Refused } from '$lib/domain/refusal';
import { audit } from '../audit/record';
import { write, type Tx } from '../db';
import { closures } from '../db/schema';
import type { Viewer } from '../guard';
import { currentGym } from '../gym/queries';
import { expand } from '../series/expand';
import { findSeries, liveSeriesIds } from '../series/queries';
import { revive } from '../slots/bring-back';
import { clashesOf } from '../slots/clashes';
import { horizonOn } from '../slots/extend-horizon';
import type { SlotWithCoaches } from '../slots/load';
import { materialise } from '../slots/materialise';
import { slotsOn } from './close';
import { isClosedOn } from '$lib/domain/calendar/closures';
import { closedDays, findClosure, type Closure } from './queries';

/**
 * Ends a closure. Slots still ahead that it called off stand again where their room and coach
 * are free, and dates that were never made are made; bookings stay released, as people were told.
 */
export async function endClosure(
	viewer: Viewer,
	closureId: number,
	{ now }: { now: number }
): Promise<
	| { ok: true; broughtBack: number; made: number; leftOut: number }
	| Refused<'no-gym' | 'not-found' | 'closure-ended'>
> {
	return write(async (tx) => {
		const [gym, closure] = [await currentGym(tx), await findClosure(closureId, tx)];
		if (!gym) return refuse('no-gym');
		if (!closure) return refuse('not-found');
		if (closure.endedAt !== null) return refuse('closure-ended');
		await tx.update(closures).set({ endedAt: now }).where(eq(closures.id, closureId));

		const back = await bringBackSlots(tx, closure, { zone: gym.zone, now });
		const again = await makeDates(tx, closure, { zone: gym.zone, now });
		const done = {
			broughtBack: back.broughtBack,
			made: again.made,
			leftOut: back.leftOut + again.leftOut
		};
		await audit(tx, {
			viewer,
			verb: 'closures.end',
			noun: 'closures',
			nounId: closureId,
			now,
			detail: done
		});
		return { ok: true, ...done };
	});
}

/** A closure and the slots that it called off carry one instant: they were written together. */
async function bringBackSlots(
	tx: Tx,
	closure: Closure,
	{ zone, now }: { zone: string; now: number }
) {
	const closed = await closedDays(tx);
	const back = (await slotsOn(tx, closure)).filter(
		(slot) =>
			slot.startsAt > now &&
			slot.cancelledAt === closure.createdAt &&
			slot.cancelReason === closure.why &&
			!isClosedOn(closed, slot.startsOn, slot.roomId)
	);
	const meant: SlotWithCoaches[] = [];
	for (const slot of back) if (await isStillMeant(tx, slot, zone)) meant.push(slot);
	let broughtBack = 0;
	for (const slot of meant) {
		if ((await clashesOf([{ ...slot, slotId: slot.id }], tx)).length > 0) continue;
		await revive(tx, slot, now);
		broughtBack += 1;
	}
	return { broughtBack, leftOut: meant.length - broughtBack };
}

/** A series that ended meanwhile, or whose rule changed, does not mean its old dates any more. */
async function isStillMeant(tx: Tx, slot: SlotWithCoaches, zone: string): Promise<boolean> {
	if (slot.seriesId === null || slot.recurrenceKey === null) return true;
	const one = await findSeries(slot.seriesId, tx);
	const on = slot.recurrenceKey.slice(0, 10);
	const dates = one ? expand(one, { zone, fromOn: on, toOn: on }) : [];
	return dates.some(({ key }) => key === slot.recurrenceKey);
}

async function makeDates(
	tx: Tx,
	{ fromOn, toOn }: Closure,
	{ zone, now }: { zone: string; now: number }
) {
	const closed = await closedDays(tx);
	const horizon = horizonOn(localOf(now, zone).on);
	const range = { fromOn, toOn: toOn < horizon ? toOn : horizon, after: now };
	const total = { made: 0, leftOut: 0 };
	for (const id of await liveSeriesIds(now, tx)) {
		const one = await findSeries(id, tx);
		if (!one) continue;
		const { slotIds, clashes } = await materialise(tx, one, range, { zone, closed, now });
		total.made += slotIds.length;
		total.leftOut += clashes.length;
	}
	return total;
}
