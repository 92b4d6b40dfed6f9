import { desc, eq, sql } from 'drizzle-orm';
import { db, type Queryable } from '../db';
import { ledgerEntries, ledgerTransfers, passes, people } from '../db/schema';
import { balanceOf, passStates, type PassState } from './cover';

export type PassRow = typeof passes.$inferSelect & { balance: number };

/** Every pass of a person, the newest first. */
export const passesOf = (personId: number, q: Queryable = db): Promise<PassRow[]> =>
	q
		.select({
			id: passes.id,
			personId: passes.personId,
			kind: passes.kind,
			name: passes.name,
			perWeek: passes.perWeek,
			startsOn: passes.startsOn,
			endsOn: passes.endsOn,
			endedAt: passes.endedAt,
			priceCents: passes.priceCents,
			note: passes.note,
			createdAt: passes.createdAt,
			createdById: passes.createdById,
			balance: balanceOf
		})
		.from(passes)
		.where(eq(passes.personId, personId))
		.orderBy(desc(passes.startsOn), desc(passes.id));

/** What a person can book with on a day: passes in date, with what is left of each. */
export const usablePasses = async (
	personId: number,
	on: string,
	weekStartsOn: number,
	q: Queryable = db
): Promise<(PassState & { left: number | null })[]> =>
	(await passStates(personId, on, weekStartsOn, q)).map((pass) => ({
		...pass,
		left:
			pass.kind === 'pack'
				? pass.balance
				: pass.perWeek === null
					? null
					: Math.max(0, pass.perWeek - pass.usedThisWeek)
	}));

export type StatementRow = {
	id: number;
	kind: string;
	at: number;
	amount: number;
	why: string | null;
	byName: string | null;
};

/** Every movement of a pack's credits, the newest first; their sum is the balance. */
export const statementOf = (passId: number, q: Queryable = db): Promise<StatementRow[]> =>
	q
		.select({
			id: ledgerTransfers.id,
			kind: ledgerTransfers.kind,
			at: ledgerTransfers.at,
			amount: ledgerEntries.amount,
			why: ledgerTransfers.why,
			byName: people.name
		})
		.from(ledgerEntries)
		.innerJoin(ledgerTransfers, eq(ledgerTransfers.id, ledgerEntries.transferId))
		.leftJoin(people, eq(people.id, ledgerTransfers.byId))
		.where(sql`${ledgerEntries.account} = 'pass:' || ${passId}`)
		.orderBy(desc(ledgerTransfers.id));
