import { refuse, type Refused } from '$lib/domain/refusal';
import { audit } from '../audit/record';
import { write } from '../db';
import type { Viewer } from '../guard';
import { bookIn, type BookInput } from './book';
import { changeStatus } from './record';
import { findPlace } from './serve';
import { slotFacts } from './slot-facts';
import { waitlistOf } from './waitlist';

export type WalkIn = Omit<BookInput, 'memberId' | 'isWalkIn' | 'payment'> & {
	personId: number;
	/** Why those who wait were passed over. */
	passOver?: string;
};

/**
 * Lets somebody who stands at the desk into a class, checked in. Those who wait come first: while
 * somebody waits it is refused as `waitlist-first`, unless a reason is given to pass them over.
 * A walk-in never goes on the waitlist: without a place it is refused.
 */
export function walkIn(
	viewer: Pick<Viewer, 'personId' | 'capabilities'>,
	slotId: number,
	{ personId, passOver, ...input }: WalkIn
): Promise<{ ok: true; bookingId: number } | Refused<string>> {
	return write(async (tx) => {
		const slot = await slotFacts(tx, slotId);
		if (!slot) return refuse('not-found');
		const waiting = await waitlistOf(slotId, tx);
		if (waiting.length > 0 && !passOver && !waiting.some((w) => w.personId === personId)) {
			return refuse('waitlist-first', { name: waiting[0]!.name, waiting: waiting.length });
		}
		const place = await findPlace(tx, slot, input);
		if (!place.free) return refuse(place.why === 'full' ? 'full' : 'kit-short');
		const booked = await bookIn(tx, viewer, slotId, {
			...input,
			memberId: personId,
			isWalkIn: true
		});
		if (!booked.ok) return booked;
		const { id } = booked.booking;
		const fact = { now: input.now, byId: viewer.personId, why: passOver };
		await changeStatus(tx, { id, status: 'booked' }, 'attended', fact, { checkedInAt: input.now });
		const detail = { slotId, personId, ...(passOver ? { passOver } : {}) };
		const said = { viewer, verb: 'bookings.walk-in', noun: 'bookings', nounId: id, now: input.now };
		await audit(tx, { ...said, detail });
		return { ok: true, bookingId: id };
	});
}
