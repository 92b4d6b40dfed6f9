import { and, eq, isNull, sql } from 'drizzle-orm';
import type { Tx } from '../db';
import { ledgerEntries, ledgerTransfers } from '../db/schema';

type Fact = { now: number; byId: number | null; bookingId?: number; why?: string };
type Kind = (typeof ledgerTransfers.$inferInsert)['kind'];

/** Puts `credits` into a pack, out of what the gym issues. */
export const grantCredits = (tx: Tx, passId: number, credits: number, fact: Fact) =>
	transfer(tx, 'grant', 'issued', `pass:${passId}`, credits, fact);

/** Uses one credit of a pack for a booking. The ledger's trigger refuses a pack that is empty. */
export const useCredit = (tx: Tx, passId: number, fact: Fact & { bookingId: number }) =>
	transfer(tx, 'use', `pass:${passId}`, 'used', 1, fact);

/** Takes credits out of a pack (`credits` below zero) or adds them, with the reason. */
export const correctCredits = (
	tx: Tx,
	passId: number,
	credits: number,
	fact: Fact & { why: string }
) => transfer(tx, 'correct', 'issued', `pass:${passId}`, credits, fact);

/** Gives back what a booking used, once; nothing where it used no credit or has it back already. */
export async function giveBackCredit(
	tx: Tx,
	bookingId: number,
	fact: Omit<Fact, 'bookingId'>
): Promise<boolean> {
	const [use] = await tx
		.select({ id: ledgerTransfers.id, account: ledgerEntries.account })
		.from(ledgerTransfers)
		.innerJoin(ledgerEntries, eq(ledgerEntries.transferId, ledgerTransfers.id))
		.where(
			and(
				eq(ledgerTransfers.bookingId, bookingId),
				eq(ledgerTransfers.kind, 'use'),
				sql`${ledgerEntries.amount} < 0`,
				isNull(
					sql`(select r.id from ledger_transfers r where r.reverses_id = ${ledgerTransfers.id})`
				)
			)
		);
	if (!use) return false;
	await transfer(tx, 'give-back', 'used', use.account, 1, { ...fact, bookingId }, use.id);
	return true;
}

/** Moves `credits` from one account to the other: two entries that sum to zero. */
async function transfer(
	tx: Tx,
	kind: Kind,
	from: string,
	to: string,
	credits: number,
	{ now, byId, bookingId, why }: Fact,
	reversesId?: number
): Promise<void> {
	const { id } = await tx
		.insert(ledgerTransfers)
		.values({ kind, at: now, byId, bookingId, why, reversesId })
		.returning({ id: ledgerTransfers.id })
		.get();
	await tx.insert(ledgerEntries).values([
		{ transferId: id, account: to, unit: 'credit', amount: credits },
		{ transferId: id, account: from, unit: 'credit', amount: -credits }
	]);
}
