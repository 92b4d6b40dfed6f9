import { cutOffAt } from '$lib/domain/booking';
import { audit } from '../audit/record';
import type { Tx } from '../db';
import type { Viewer } from '../guard';
import { promotedLetter } from '../messages/booking-letters';
import { passFor, payByPass } from './pay';
import { changeStatus } from './record';
import { findPlace, roomIn } from './serve';
import type { SlotFacts } from './slot-facts';
import { tellPerson } from './tell';
import { waitlistOf, type Waiting } from './waitlist';

/** What came of the waitlist: who got a place, and who kept their turn, with the reason. */
export type Promotion = {
	promoted: { bookingId: number; personId: number; name: string }[];
	passedOver: { bookingId: number; personId: number; why: 'kit' | 'no-pass' }[];
};

/**
 * Gives free places to those who wait, first come first served among those who can be served,
 * until the cut-off. Asks the kit for each; who cannot be served keeps their turn.
 */
export async function promoteNext(
	tx: Tx,
	slot: SlotFacts,
	fact: { now: number; byId: number | null }
): Promise<Promotion> {
	const outcome: Promotion = { promoted: [], passedOver: [] };
	if (slot.cancelledAt !== null || fact.now > cutOffAt(slot)) return outcome;
	const room = await roomIn(tx, slot);
	for (const waiting of await waitlistOf(slot.id, tx)) {
		const place = room.for(waiting);
		if (!place.free && place.why === 'full') break;
		const { id: bookingId, personId, name } = waiting;
		if (!place.free) outcome.passedOver.push({ bookingId, personId, why: 'kit' });
		else if (await giveTo(tx, slot, waiting, fact)) {
			room.take(waiting);
			outcome.promoted.push({ bookingId, personId, name });
		} else outcome.passedOver.push({ bookingId, personId, why: 'no-pass' });
	}
	return outcome;
}

/** Staff give a waiting person the place by hand, whoever waits before them; it is in the audit log. */
export async function givePlace(
	tx: Tx,
	viewer: Pick<Viewer, 'personId'>,
	slot: SlotFacts,
	waiting: Waiting,
	now: number
): Promise<'given' | 'full' | 'kit' | 'no-pass'> {
	const place = await findPlace(tx, slot, waiting);
	if (!place.free) return place.why;
	if (!(await giveTo(tx, slot, waiting, { now, byId: viewer.personId }))) return 'no-pass';
	const detail = { slotId: slot.id, personId: waiting.personId };
	const fact = { viewer, verb: 'bookings.give-place', noun: 'bookings', nounId: waiting.id };
	await audit(tx, { ...fact, now, detail });
	return 'given';
}

/** The person is in and pays; false where no pass of theirs covers it any more. */
async function giveTo(
	tx: Tx,
	slot: SlotFacts,
	waiting: Waiting,
	fact: { now: number; byId: number | null }
): Promise<boolean> {
	const pass = waiting.complimentaryWhy === null ? await passFor(tx, waiting.personId, slot) : null;
	if (!pass && waiting.complimentaryWhy === null) return false;
	await changeStatus(tx, waiting, 'booked', { ...fact, why: 'promoted' });
	if (pass) await payByPass(tx, waiting.id, pass, fact);
	await tellPerson(tx, waiting, slot, 'promoted', promotedLetter, fact.now);
	return true;
}
