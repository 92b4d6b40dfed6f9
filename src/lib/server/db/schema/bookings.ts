import { sql } from 'drizzle-orm';
import {
	check,
	index,
	integer,
	real,
	sqliteTable,
	text,
	uniqueIndex
} from 'drizzle-orm/sqlite-core';
import { flag, instant, rowId } from './columns';
import { people } from './people';
import { passes } from './passes';
import { slots } from './timetable';

export const bookingStatuses = [
	'held',
	'booked',
	'waitlisted',
	'attended',
	'no-show',
	'cancelled',
	'late-cancelled',
	'released'
] as const;
export type BookingStatus = (typeof bookingStatuses)[number];

/** Prescription id -> variation id. */
export type VariationChoices = Record<string, number>;
/** Prescription id -> the kilograms wanted, lowest and highest. */
export type LoadChoices = Record<string, [number, number]>;

/** A person's claim on a slot. Its number is its place in the queue: first come, first served. */
export const bookings = sqliteTable(
	'bookings',
	{
		id: rowId(),
		slotId: integer('slot_id')
			.notNull()
			.references(() => slots.id),
		personId: integer('person_id')
			.notNull()
			.references(() => people.id),
		status: text('status', { enum: bookingStatuses }).notNull(),
		/** Order on the waitlist; the booking's number unless staff moved it to the head. */
		queueRank: real('queue_rank'),
		variations: text('variations', { mode: 'json' })
			.$type<VariationChoices>()
			.notNull()
			.default({}),
		loads: text('loads', { mode: 'json' }).$type<LoadChoices>().notNull().default({}),
		/** Said to the coach with this booking. */
		note: text('note'),
		/** What pays: exactly one of a pass and a complimentary mark once the person is in. */
		passId: integer('pass_id').references(() => passes.id),
		complimentaryById: integer('complimentary_by_id').references(() => people.id),
		complimentaryWhy: text('complimentary_why'),
		heldUntil: instant('held_until'),
		isLate: flag('is_late'),
		isWalkIn: flag('is_walk_in'),
		checkedInAt: instant('checked_in_at'),
		createdAt: instant('created_at').notNull(),
		createdById: integer('created_by_id').references(() => people.id),
		updatedAt: instant('updated_at').notNull()
	},
	(t) => [
		uniqueIndex('bookings_live')
			.on(t.slotId, t.personId)
			.where(sql`${t.status} in ('held','booked','waitlisted','attended','no-show')`),
		index('bookings_slot').on(t.slotId, t.status),
		index('bookings_person').on(t.personId, t.slotId),
		index('bookings_pass').on(t.passId),
		check(
			'bookings_complimentary',
			sql`(${t.complimentaryById} is null) = (${t.complimentaryWhy} is null)`
		),
		check('bookings_paid_once', sql`${t.passId} is null or ${t.complimentaryById} is null`)
	]
);

/** Every change of a booking's status, with who and when. Append-only. */
export const bookingChanges = sqliteTable(
	'booking_changes',
	{
		id: rowId(),
		bookingId: integer('booking_id')
			.notNull()
			.references(() => bookings.id),
		fromStatus: text('from_status', { enum: bookingStatuses }),
		toStatus: text('to_status', { enum: bookingStatuses }).notNull(),
		at: instant('at').notNull(),
		byId: integer('by_id').references(() => people.id),
		why: text('why')
	},
	(t) => [index('booking_changes_booking').on(t.bookingId)]
);

/** What a request with an Idempotency-Key answered, so that its repeat answers the same. */
export const idempotencyKeys = sqliteTable(
	'idempotency_keys',
	{
		id: rowId(),
		personId: integer('person_id')
			.notNull()
			.references(() => people.id),
		key: text('key').notNull(),
		route: text('route').notNull(),
		bodyHash: text('body_hash').notNull(),
		status: integer('status').notNull(),
		answer: text('answer').notNull(),
		createdAt: instant('created_at').notNull()
	},
	(t) => [
		uniqueIndex('idempotency_keys_key').on(t.personId, t.key),
		index('idempotency_keys_created').on(t.createdAt)
	]
);
