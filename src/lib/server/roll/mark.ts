import { and, eq, inArray } from 'drizzle-orm';
import { refuse, type Refused } from '$lib/domain/refusal';
import { audit } from '../audit/record';
import { write, type Tx } from '../db';
import { bookings } from '../db/schema';
import { changeStatus } from '../bookings/record';
import { slotFacts, type SlotFacts } from '../bookings/slot-facts';
import type { Viewer } from '../guard';
import { mayTakeRoll } from './queries';

/** `booked` undoes a mark. `at` is when the person came, epoch ms; the moment of the mark where left out. */
export type Mark = {
	bookingId: number;
	status: 'attended' | 'no-show' | 'booked';
	late?: boolean;
	at?: number;
};

type Outcome = { ok: true; changed: number } | Refused<string>;

/** How long before its start a class's roll opens. */
const opensBeforeMs = 3 * 3_600_000;

/**
 * Marks who came. All marks of a call stand or none. The same mark again changes nothing.
 * Late is a mark on who came, not a state.
 */
export function markRoll(
	viewer: Pick<Viewer, 'personId' | 'capabilities'>,
	slotId: number,
	marks: Mark[],
	{ now }: { now: number }
): Promise<Outcome> {
	return write(async (tx) => {
		const slot = await slotFacts(tx, slotId);
		if (!slot || !(await mayTakeRoll(viewer, slotId, tx))) return refuse('not-found');
		const refused = refusedRoll(slot, marks, now);
		if (refused) return refused;
		const rows = await tx
			.select()
			.from(bookings)
			.where(
				and(
					eq(bookings.slotId, slotId),
					inArray(
						bookings.id,
						marks.map((mark) => mark.bookingId)
					)
				)
			);
		const byId = new Map(rows.map((row) => [row.id, row]));
		for (const { bookingId } of marks) {
			const status = byId.get(bookingId)?.status;
			if (status === undefined) return refuse('not-found');
			if (!markable.has(status)) return refuse('not-on-roll', { status });
		}
		let changed = 0;
		for (const mark of marks)
			if (await apply(tx, viewer, byId.get(mark.bookingId)!, mark, now)) changed += 1;
		return { ok: true, changed };
	});
}

const markable = new Set<string>(['booked', 'attended', 'no-show']);

function refusedRoll(slot: SlotFacts, marks: Mark[], now: number): Refused<string> | null {
	if (slot.cancelledAt !== null) return refuse('cancelled');
	if (now < slot.startsAt - opensBeforeMs) return refuse('roll-not-open');
	const absent = marks.some(({ status }) => status === 'no-show');
	return absent && now < slot.startsAt ? refuse('not-started') : null;
}

async function apply(
	tx: Tx,
	viewer: Pick<Viewer, 'personId'>,
	booking: typeof bookings.$inferSelect,
	{ status, late, at }: Mark,
	now: number
): Promise<boolean> {
	const isLate = status === 'attended' && (late ?? booking.isLate);
	const checkedInAt = status === 'attended' ? (at ?? booking.checkedInAt ?? now) : null;
	if (
		booking.status === status &&
		booking.isLate === isLate &&
		(at === undefined || booking.checkedInAt === at)
	) {
		return false;
	}
	const fact = { now, byId: viewer.personId };
	await changeStatus(tx, booking, status, fact, { isLate, checkedInAt });
	const detail = { slotId: booking.slotId, from: booking.status, to: status, late: isLate };
	await audit(tx, { viewer, verb: 'roll.mark', noun: 'bookings', nounId: booking.id, now, detail });
	return true;
}
