import type { Tx } from '../db';
import { giveBackCredit } from '../passes/credits';
import { changeStatus } from './record';

/** Ends a booking because the gym called its class off: the credit comes back, whenever it is. */
export async function release(
	tx: Tx,
	booking: { id: number; status: 'held' | 'booked' | 'waitlisted' },
	fact: { now: number; byId: number | null; why: string }
): Promise<void> {
	await changeStatus(tx, booking, 'released', fact);
	await giveBackCredit(tx, booking.id, fact);
}
