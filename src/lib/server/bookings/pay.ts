import { eq } from 'drizzle-orm';
import type { Tx } from '../db';
import { bookings } from '../db/schema';
import { useCredit } from '../passes/credits';
import { passCovering, type PassState } from '../passes/cover';
import type { SlotFacts } from './slot-facts';

/** Pays a booking by a pass: a pack gives a credit, a membership its week. */
export async function payByPass(
	tx: Tx,
	bookingId: number,
	pass: Pick<PassState, 'id' | 'kind'>,
	fact: { now: number; byId: number | null }
): Promise<void> {
	await tx.update(bookings).set({ passId: pass.id }).where(eq(bookings.id, bookingId));
	await useOneCredit(tx, bookingId, pass, fact);
}

/** What a place costs the pass that is named on it: a pack's credit. */
export async function useOneCredit(
	tx: Tx,
	bookingId: number,
	pass: Pick<PassState, 'id' | 'kind'>,
	fact: { now: number; byId: number | null }
): Promise<void> {
	if (pass.kind === 'pack') await useCredit(tx, pass.id, { ...fact, bookingId });
}

/** The pass that would pay a person's place in this class. */
export const passFor = (tx: Tx, personId: number, slot: SlotFacts): Promise<PassState | null> =>
	passCovering(personId, slot.startsOn, slot.weekStartsOn, tx);
