import { refuse, type Refused } from '$lib/domain/refusal';
import { write } from '../db';
import type { Viewer } from '../guard';
import { givePlace } from './promote';
import { slotFacts } from './slot-facts';
import { waitlistOf } from './waitlist';

/** The desk gives somebody who waits the place: the first in turn unless another booking is named. */
export function giveToWaiting(
	viewer: Pick<Viewer, 'personId'>,
	slotId: number,
	{ bookingId, now }: { bookingId?: number; now: number }
): Promise<{ ok: true; bookingId: number; name: string } | Refused<string>> {
	return write(async (tx) => {
		const slot = await slotFacts(tx, slotId);
		if (!slot) return refuse('not-found');
		if (slot.cancelledAt !== null) return refuse('cancelled');
		if (now >= slot.endsAt) return refuse('past');
		const waiting = await waitlistOf(slotId, tx);
		const next = bookingId === undefined ? waiting[0] : waiting.find(({ id }) => id === bookingId);
		if (!next) return refuse('nobody-waits');
		const outcome = await givePlace(tx, viewer, slot, next, now);
		if (outcome === 'given') return { ok: true, bookingId: next.id, name: next.name };
		return refuse(outcome === 'kit' ? 'kit-short' : outcome);
	});
}
