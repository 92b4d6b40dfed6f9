import { and, eq } from 'drizzle-orm';
import { refuse, type Refused } from '$lib/domain/refusal';
import { audit } from '../audit/record';
import { write } from '../db';
import { bookings } from '../db/schema';
import { changeStatus } from '../bookings/record';
import { slotFacts } from '../bookings/slot-facts';
import type { Viewer } from '../guard';
import { mayTakeRoll } from './queries';

/** At the end: whoever is booked and not marked did not come. */
export function closeRoll(
	viewer: Pick<Viewer, 'personId' | 'capabilities'>,
	slotId: number,
	{ now }: { now: number }
): Promise<{ ok: true; noShows: number } | Refused<string>> {
	return write(async (tx) => {
		const slot = await slotFacts(tx, slotId);
		if (!slot || !(await mayTakeRoll(viewer, slotId, tx))) return refuse('not-found');
		if (slot.cancelledAt !== null) return refuse('cancelled');
		if (now < slot.startsAt) return refuse('not-started');
		const absent = await tx
			.select()
			.from(bookings)
			.where(and(eq(bookings.slotId, slotId), eq(bookings.status, 'booked')));
		for (const booking of absent) {
			await changeStatus(tx, booking, 'no-show', { now, byId: viewer.personId });
		}
		const detail = { noShows: absent.length };
		await audit(tx, { viewer, verb: 'roll.close', noun: 'slots', nounId: slotId, now, detail });
		return { ok: true, noShows: absent.length };
	});
}
