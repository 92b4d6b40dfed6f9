import type { Tx } from '..';
import {
	auditEntries,
	bookingChanges,
	bookings,
	ledgerEntries,
	ledgerTransfers,
	type BookingStatus
} from '../schema';
import { insertAll } from './insert-all';

type Change = { to: BookingStatus; at: number; byId: number | null; why?: string };
type BookingRow = typeof bookings.$inferInsert;

/** A booking and all that happened to it; its status is that of the last change. */
export type BookingDraft = {
	row: Omit<BookingRow, 'id' | 'status' | 'createdAt' | 'updatedAt' | 'createdById'>;
	/** The first is how it was made. */
	changes: [Change, ...Change[]];
	/** The pack that gave a credit, when, and when the credit came back. */
	credit?: { passId: number; at: number; backAt?: number };
};
type AuditDraft = {
	at: number;
	byId: number | null;
	verb: string;
	noun: string;
	nounId?: number;
	/** For an entry about a booking, which has no number yet. */
	booking?: BookingDraft;
	detail?: Record<string, unknown>;
};
type TransferDraft = {
	kind: 'grant' | 'use' | 'give-back';
	at: number;
	byId: number | null;
	from: string;
	to: string;
	credits: number;
	booking?: BookingDraft;
	reverses?: TransferDraft;
};

/**
 * What the gym's days left behind, gathered in any order and written by time, so that numbers rise
 * as they would have: the ledger never dips below nothing, the queue is in order.
 */
export class Records {
	readonly #bookings: BookingDraft[] = [];
	readonly #transfers: TransferDraft[] = [];
	readonly #audits: AuditDraft[] = [];

	book(draft: BookingDraft): void {
		this.#bookings.push(draft);
		if (!draft.credit) return;
		const { passId, at, backAt } = draft.credit;
		const pack = `pass:${passId}`;
		const byId = draft.changes[0].byId;
		const common = { byId, credits: 1, booking: draft };
		const use: TransferDraft = { ...common, kind: 'use', at, from: pack, to: 'used' };
		this.#transfers.push(use);
		if (backAt === undefined) return;
		this.#transfers.push({
			...common,
			kind: 'give-back',
			at: backAt,
			from: 'used',
			to: pack,
			reverses: use
		});
	}

	grant(passId: number, credits: number, { at, byId }: { at: number; byId: number }): void {
		this.#transfers.push({
			kind: 'grant',
			at,
			byId,
			from: 'issued',
			to: `pass:${passId}`,
			credits
		});
	}

	audit(draft: AuditDraft): void {
		this.#audits.push(draft);
	}

	async write(tx: Tx): Promise<void> {
		const drafts = byTime(this.#bookings, (draft) => draft.changes[0].at);
		const ids = new Map(drafts.map((draft, i) => [draft, i + 1]));
		await insertAll(
			tx,
			bookings,
			drafts.map((draft) => rowOf(draft, ids.get(draft)!))
		);
		const changes = drafts.flatMap((draft) => changesOf(draft, ids.get(draft)!));
		await insertAll(
			tx,
			bookingChanges,
			byTime(changes, ({ at }) => at)
		);
		await this.#writeLedger(tx, ids);
		await insertAll(
			tx,
			auditEntries,
			byTime(this.#audits, ({ at }) => at).map(
				({ at, byId, verb, noun, nounId, booking, detail }) => ({
					at,
					actorId: byId,
					verb,
					noun,
					nounId: booking ? ids.get(booking)! : (nounId ?? null),
					detail: detail ?? {}
				})
			)
		);
	}

	async #writeLedger(tx: Tx, bookingIds: Map<BookingDraft, number>): Promise<void> {
		const drafts = byTime(this.#transfers, ({ at }) => at);
		const ids = new Map(drafts.map((draft, i) => [draft, i + 1]));
		const rows = drafts.map((draft) => ({
			id: ids.get(draft)!,
			kind: draft.kind,
			at: draft.at,
			byId: draft.byId,
			bookingId: draft.booking ? bookingIds.get(draft.booking)! : null,
			reversesId: draft.reverses ? ids.get(draft.reverses)! : null
		}));
		await insertAll(tx, ledgerTransfers, rows);
		const entries = drafts.flatMap((draft) => {
			const common = { transferId: ids.get(draft)!, unit: 'credit' };
			return [
				{ ...common, account: draft.to, amount: draft.credits },
				{ ...common, account: draft.from, amount: -draft.credits }
			];
		});
		await insertAll(tx, ledgerEntries, entries);
	}
}

function rowOf({ row, changes }: BookingDraft, id: number): BookingRow {
	const [made] = changes;
	const last = changes.at(-1)!;
	const times = { createdAt: made.at, createdById: made.byId, updatedAt: last.at };
	return { ...row, id, status: last.to, ...times };
}

const changesOf = ({ changes }: BookingDraft, bookingId: number) =>
	changes.map(({ to, at, byId, why }, i) => ({
		bookingId,
		fromStatus: i === 0 ? null : changes[i - 1]!.to,
		toStatus: to,
		at,
		byId,
		why: why ?? null
	}));

/** In order of time; what is said first stays first among equals. */
const byTime = <T>(items: readonly T[], at: (item: T) => number): T[] =>
	[...items].sort((a, b) => at(a) - at(b));
