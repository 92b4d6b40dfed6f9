import { eq } from 'drizzle-orm';
import { cancelKind, cutOffAt } from '$lib/domain/booking';
import { refuse, type Refused } from '$lib/domain/refusal';
import { audit } from '../audit/record';
import { write, type Tx } from '../db';
import { bookings, people } from '../db/schema';
import type { Viewer } from '../guard';
import { cancelledByStaffLetter } from '../messages/booking-letters';
import { giveBackCredit } from '../passes/credits';
import type { AlsoIn } from './book';
import { promoteNext, type Promotion } from './promote';
import { changeStatus } from './record';
import { slotFacts } from './slot-facts';
import { tellPerson } from './tell';

export type Cancelled = {
	ok: true;
	booking: { id: number; status: 'cancelled' | 'late-cancelled' };
	creditGivenBack: boolean;
} & Promotion;

/** `waive`: why staff let a late cancellation off. */
export type CancelInput = { now: number; waive?: string };

type Actor = Pick<Viewer, 'personId' | 'capabilities'>;

/**
 * Gives up a place or a turn. In time the credit comes back; after the cut-off it stays used,
 * unless staff waive that with a reason. A turn on the waitlist is never late.
 * Effects: the credit, the next on the waitlist, a message where staff did it for somebody.
 */
export function cancel(
	viewer: Actor,
	bookingId: number,
	input: CancelInput,
	also?: AlsoIn<Cancelled | Refused<string>>
): Promise<Cancelled | Refused<string>> {
	return write(async (tx) => {
		const cancelled = await cancelIn(tx, viewer, bookingId, input);
		await also?.(tx, cancelled);
		return cancelled;
	});
}

async function cancelIn(
	tx: Tx,
	viewer: Actor,
	bookingId: number,
	{ now, waive }: CancelInput
): Promise<Cancelled | Refused<string>> {
	const booking = await findFor(tx, viewer, bookingId);
	if (!booking) return refuse('not-found');
	const wasIn = booking.status === 'booked' || booking.status === 'held';
	if (!wasIn && booking.status !== 'waitlisted') return refuse('not-live');
	const slot = (await slotFacts(tx, booking.slotId))!;
	if (now >= slot.endsAt || (now >= slot.startsAt && !isStaff(viewer))) return refuse('past');

	const kind = wasIn ? cancelKind(now, cutOffAt(slot)) : 'cancelled';
	const status = waive && isStaff(viewer) ? 'cancelled' : kind;
	const byId = viewer.personId;
	await changeStatus(tx, booking, status, { now, byId, why: waive });
	const creditGivenBack =
		wasIn && status === 'cancelled' ? await giveBackCredit(tx, bookingId, { now, byId }) : false;
	const promotion = wasIn
		? await promoteNext(tx, slot, { now, byId: null })
		: { promoted: [], passedOver: [] };
	if (booking.personId !== viewer.personId) {
		const detail = {
			slotId: slot.id,
			personId: booking.personId,
			status,
			...(waive ? { waive } : {})
		};
		const fact = { viewer, verb: 'bookings.cancel', noun: 'bookings', nounId: bookingId };
		await audit(tx, { ...fact, now, detail });
		await tellPerson(tx, booking, slot, 'cancelled-by-staff', cancelledByStaffLetter, now);
	}
	return { ok: true, booking: { id: bookingId, status }, creditGivenBack, ...promotion };
}

const isStaff = (viewer: Actor) => viewer.capabilities.has('bookings:write-any');

/** A booking through the eyes of who asks: one's own, or anybody's for the desk. */
export async function findFor(tx: Tx, viewer: Actor, bookingId: number) {
	const row = await tx
		.select({
			id: bookings.id,
			slotId: bookings.slotId,
			personId: bookings.personId,
			status: bookings.status,
			variations: bookings.variations,
			loads: bookings.loads,
			complimentaryWhy: bookings.complimentaryWhy,
			name: people.name,
			email: people.email
		})
		.from(bookings)
		.innerJoin(people, eq(people.id, bookings.personId))
		.where(eq(bookings.id, bookingId))
		.get();
	return row && (row.personId === viewer.personId || isStaff(viewer)) ? row : null;
}
