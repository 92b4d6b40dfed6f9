import { bookingWindow, mayBook } from '$lib/domain/booking';
import { refuse, type Refused } from '$lib/domain/refusal';
import { checkChoices, type Choices } from '$lib/domain/training';
import { audit } from '../audit/record';
import { write, type Tx } from '../db';
import type { LoadChoices } from '../db/schema';
import type { Viewer } from '../guard';
import { libraryAt } from '../kit/library';
import { passFor, useOneCredit } from './pay';
import { personFacts } from './person-facts';
import { recordBooking } from './record';
import { findPlace, type PlaceAnswer } from './serve';
import { slotFacts, type SlotFacts } from './slot-facts';
import { positionOf } from './waitlist';

export type BookInput = Choices & {
	/** A pass where left out; a drop-in cannot be paid yet. */
	payment?: 'pass' | 'drop-in';
	/** For somebody else: wants `bookings:write-any`. */
	memberId?: number;
	/** Said to the coach. */
	note?: string;
	/** Nothing is paid, for this reason: staff only. */
	complimentary?: string;
	isWalkIn?: boolean;
	now: number;
};

export type Booked = {
	ok: true;
	booking: { id: number; status: 'booked' | 'waitlisted'; position?: number };
	/** Where the kit is short as chosen: variation ids by prescription with which there is a place. */
	offer?: Record<string, number>;
};

/** What is to be kept in a command's own transaction once its answer is known. */
export type AlsoIn<Answer> = (tx: Tx, answer: Answer) => Promise<void>;

type Actor = Pick<Viewer, 'personId' | 'capabilities'>;

/**
 * Books a place, or a turn on the waitlist where no place is free or the kit is short as chosen.
 * A waiting booking needs a pass that would cover it, and pays when it gets the place.
 */
export function book(
	viewer: Actor,
	slotId: number,
	input: BookInput,
	also?: AlsoIn<Booked | Refused<string>>
): Promise<Booked | Refused<string>> {
	return write(async (tx) => {
		const booked = await bookIn(tx, viewer, slotId, input);
		await also?.(tx, booked);
		return booked;
	});
}

/** `book` inside a transaction that has more to do. */
export async function bookIn(
	tx: Tx,
	viewer: Actor,
	slotId: number,
	input: BookInput
): Promise<Booked | Refused<string>> {
	const personId = input.memberId ?? viewer.personId;
	const byStaff = viewer.capabilities.has('bookings:write-any');
	if (personId !== viewer.personId && !byStaff) return refuse('not-allowed');
	if (input.complimentary && !byStaff) return refuse('not-allowed');
	if (input.payment === 'drop-in') return refuse('payment-unavailable');

	const slot = await slotFacts(tx, slotId);
	if (!slot) return refuse('not-found');
	const refused = await refusedBooking(tx, slot, personId, viewer, input);
	if (refused) return refused;

	const pass = input.complimentary ? null : await passFor(tx, personId, slot);
	if (!pass && !input.complimentary) return refuse('no-pass');
	const place = await findPlace(tx, slot, input);
	return enter(tx, viewer, slot, { ...input, personId }, place, pass);
}

async function refusedBooking(
	tx: Tx,
	slot: SlotFacts,
	personId: number,
	{ capabilities }: Actor,
	input: BookInput
): Promise<Refused<string> | null> {
	const window = bookingWindow(slot);
	const byStaff = capabilities.has('bookings:write-any');
	const isStaff = capabilities.has('schedule:read-all');
	const may = mayBook({ ...slot, window, byStaff, isStaff, now: input.now, hasPass: true });
	if (!may.ok) return may;
	const person = await personFacts(tx, personId, slot);
	if (!person) return refuse('no-person');
	if (person.bookingId !== null) return refuse('already-booked', { bookingId: person.bookingId });
	if (person.overlapping !== null) return refuse('overlapping', { class: person.overlapping });
	const { rules } = await libraryAt(slot.libraryVersion);
	const choices = checkChoices(input, slot.content ?? { blocks: [] }, rules);
	return choices.ok ? null : choices;
}

async function enter(
	tx: Tx,
	viewer: Actor,
	slot: SlotFacts,
	input: BookInput & { personId: number },
	place: PlaceAnswer,
	pass: Awaited<ReturnType<typeof passFor>>
): Promise<Booked> {
	const status = place.free ? 'booked' : 'waitlisted';
	const { now, personId, complimentary } = input;
	const byId = viewer.personId;
	const id = await recordBooking(tx, {
		slotId: slot.id,
		personId,
		status,
		variations: { ...input.variations },
		loads: rangesOf(input.loads),
		note: input.note || null,
		passId: place.free ? (pass?.id ?? null) : null,
		complimentaryById: complimentary ? byId : null,
		complimentaryWhy: complimentary ?? null,
		isWalkIn: input.isWalkIn ?? false,
		now,
		byId
	});
	if (place.free && pass) await useOneCredit(tx, id, pass, { now, byId });
	if (personId !== viewer.personId) {
		const detail = {
			slotId: slot.id,
			personId,
			status,
			...(complimentary ? { complimentary } : {})
		};
		await audit(tx, { viewer, verb: 'bookings.book', noun: 'bookings', nounId: id, now, detail });
	}
	if (place.free) return { ok: true, booking: { id, status: 'booked' } };
	const position = await positionOf(tx, id);
	const offer = place.offer ?? undefined;
	return { ok: true, booking: { id, status: 'waitlisted', position }, ...(offer ? { offer } : {}) };
}

/** One load is a range of that load alone. */
export function rangesOf(loads: Choices['loads'] = {}): LoadChoices {
	return Object.fromEntries(
		Object.entries(loads).map(([id, load]) => [
			id,
			typeof load === 'number' ? [load, load] : [load[0], load[1]]
		])
	);
}
