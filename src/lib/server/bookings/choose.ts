import { eq } from 'drizzle-orm';
import { refuse, type Refused } from '$lib/domain/refusal';
import { checkChoices, type Choices } from '$lib/domain/training';
import { audit } from '../audit/record';
import { write } from '../db';
import { bookings } from '../db/schema';
import type { Viewer } from '../guard';
import { libraryAt } from '../kit/library';
import { findFor } from './cancel';
import { passFor, payByPass } from './pay';
import { changeStatus } from './record';
import { findPlace } from './serve';
import { rangesOf } from './book';
import { slotFacts } from './slot-facts';

export type Chosen = { ok: true; booking: { id: number; status: 'booked' | 'waitlisted' } };

/**
 * Changes how a person will do a class. Who is in keeps the place, if the kit holds; who waits
 * takes an offered variation and is in when it does, in their turn or not: nobody else is served less.
 */
export function choose(
	viewer: Pick<Viewer, 'personId' | 'capabilities'>,
	bookingId: number,
	{ now, note, ...choices }: Choices & { now: number; note?: string }
): Promise<Chosen | Refused<string>> {
	return write(async (tx) => {
		const booking = await findFor(tx, viewer, bookingId);
		if (!booking) return refuse('not-found');
		if (booking.status !== 'booked' && booking.status !== 'waitlisted') return refuse('not-live');
		const slot = (await slotFacts(tx, booking.slotId))!;
		if (slot.cancelledAt !== null) return refuse('cancelled');
		if (now >= slot.startsAt) return refuse('past');
		const { rules } = await libraryAt(slot.libraryVersion);
		const checked = checkChoices(choices, slot.content ?? { blocks: [] }, rules);
		if (!checked.ok) return checked;

		const place = await findPlace(tx, slot, choices, bookingId);
		const waits = booking.status === 'waitlisted';
		if (!place.free && !waits && place.why === 'kit') return refuse('kit-short');
		const isFree = booking.complimentaryWhy !== null;
		const pass = waits && place.free && !isFree ? await passFor(tx, booking.personId, slot) : null;
		const isIn = !waits || (place.free && (isFree || pass !== null));
		await tx
			.update(bookings)
			.set({
				variations: { ...choices.variations },
				loads: rangesOf(choices.loads),
				...(note === undefined ? {} : { note: note || null }),
				updatedAt: now
			})
			.where(eq(bookings.id, bookingId));
		const byId = viewer.personId;
		if (waits && isIn) {
			await changeStatus(tx, booking, 'booked', { now, byId, why: 'chose what the kit serves' });
			if (pass) await payByPass(tx, bookingId, pass, { now, byId });
		}
		if (booking.personId !== byId) {
			const fact = { viewer, verb: 'bookings.choose', noun: 'bookings', nounId: bookingId };
			await audit(tx, { ...fact, now, detail: { slotId: slot.id, personId: booking.personId } });
		}
		return {
			ok: true,
			booking: { id: bookingId, status: isIn ? 'booked' : 'waitlisted' }
		};
	});
}
