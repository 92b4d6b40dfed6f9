import { sql } from 'drizzle-orm';
import { check, index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';
import { instant, rowId } from './columns';
import { people } from './people';

/** What pays for bookings: a membership (unlimited, or n a week) or a pack of credits. */
export const passes = sqliteTable(
	'passes',
	{
		id: rowId(),
		personId: integer('person_id')
			.notNull()
			.references(() => people.id),
		kind: text('kind', { enum: ['membership', 'pack'] }).notNull(),
		name: text('name').notNull(),
		/** Classes a week; null is unlimited. Memberships only. */
		perWeek: integer('per_week'),
		startsOn: text('starts_on').notNull(),
		/** Last day it pays for, included; null while it goes on. */
		endsOn: text('ends_on'),
		endedAt: instant('ended_at'),
		priceCents: integer('price_cents').notNull().default(0),
		note: text('note'),
		createdAt: instant('created_at').notNull(),
		createdById: integer('created_by_id').references(() => people.id)
	},
	(t) => [
		index('passes_person').on(t.personId),
		check('passes_order', sql`${t.endsOn} is null or ${t.endsOn} >= ${t.startsOn}`),
		check(
			'passes_per_week',
			sql`${t.perWeek} is null or (${t.kind} = 'membership' and ${t.perWeek} >= 1)`
		)
	]
);

export const transferKinds = ['grant', 'use', 'give-back', 'expire', 'correct'] as const;

/** One movement of credits or money between accounts. Append-only; its entries sum to zero in each unit. */
export const ledgerTransfers = sqliteTable(
	'ledger_transfers',
	{
		id: rowId(),
		kind: text('kind', { enum: transferKinds }).notNull(),
		at: instant('at').notNull(),
		byId: integer('by_id').references(() => people.id),
		bookingId: integer('booking_id'),
		/** The transfer that this one takes back: at most one may. */
		reversesId: integer('reverses_id'),
		why: text('why')
	},
	(t) => [
		index('ledger_transfers_booking').on(t.bookingId),
		uniqueIndex('ledger_transfers_reverses').on(t.reversesId)
	]
);

/** Accounts: `pass:ID` holds a pack's credits; `issued`, `used`, `expired` are the other sides. */
export const ledgerEntries = sqliteTable(
	'ledger_entries',
	{
		id: rowId(),
		transferId: integer('transfer_id')
			.notNull()
			.references(() => ledgerTransfers.id),
		account: text('account').notNull(),
		/** `credit`, or an ISO 4217 code with amounts in minor units. */
		unit: text('unit').notNull(),
		amount: integer('amount').notNull()
	},
	(t) => [
		index('ledger_entries_account').on(t.account, t.unit, t.amount),
		index('ledger_entries_transfer').on(t.transferId),
		check('ledger_entries_amount', sql`${t.amount} <> 0`)
	]
);
