import { sql } from 'drizzle-orm';
import {
	check,
	index,
	integer,
	primaryKey,
	sqliteTable,
	text,
	uniqueIndex
} from 'drizzle-orm/sqlite-core';
import { bookers, classColours } from '../../../domain/booking/class-type';
import { flag, instant, rowId } from './columns';
import { rooms } from './gym';
import { people } from './people';
import { programmes, sessionRevisions } from './sessions';

/** Kit that a class of this type claims when no session is laid: so many pieces for so many people. */
export type DefaultClaim = { kitGroupId: number; quantity: number; peoplePerPiece: number };

/** Clashes that somebody allowed this series, kept so that its later dates need not be asked again. */
export type AllowedClash = {
	kind: 'room' | 'coach';
	/** The other series. */
	seriesId: number;
	why: string;
	byId: number;
};

export const classTypes = sqliteTable(
	'class_types',
	{
		id: rowId(),
		name: text('name').notNull(),
		about: text('about').notNull().default(''),
		colour: text('colour', { enum: classColours }).notNull().default('pine'),
		lengthMin: integer('length_min').notNull(),
		programmeId: integer('programme_id').references(() => programmes.id),
		priceCents: integer('price_cents').notNull().default(0),
		whoMayBook: text('who_may_book', { enum: bookers }).notNull().default('anyone'),
		/** Booking opens this many days before, at 00:00 of the gym's day. */
		opensDaysBefore: integer('opens_days_before').notNull().default(28),
		/** Booking closes this many minutes before the start. */
		closesMinBefore: integer('closes_min_before').notNull().default(0),
		/** Cut-off: minutes before the start, or a clock time on the day before. Exactly one is set. */
		cutOffMin: integer('cut_off_min'),
		cutOffClock: text('cut_off_clock'),
		/** People to one coach; null where the gym sets none. */
		peoplePerCoach: integer('people_per_coach'),
		defaultClaims: text('default_claims', { mode: 'json' })
			.$type<DefaultClaim[]>()
			.notNull()
			.default([]),
		archivedAt: instant('archived_at'),
		createdAt: instant('created_at').notNull()
	},
	(t) => [
		uniqueIndex('class_types_name').on(t.name),
		check('class_types_length', sql`${t.lengthMin} between 5 and 480`),
		check('class_types_cut_off', sql`(${t.cutOffMin} is null) <> (${t.cutOffClock} is null)`)
	]
);

/** A recurring class: wall-clock time in the gym's zone. */
export const series = sqliteTable(
	'series',
	{
		id: rowId(),
		classTypeId: integer('class_type_id')
			.notNull()
			.references(() => classTypes.id),
		roomId: integer('room_id')
			.notNull()
			.references(() => rooms.id),
		startsOn: text('starts_on').notNull(),
		/** Local "HH:MM". */
		startTime: text('start_time').notNull(),
		lengthMin: integer('length_min').notNull(),
		/** RFC 5545 RRULE value, within the allowed subset of $lib/domain/calendar. */
		rule: text('rule').notNull(),
		/** Places set by hand; null leaves room, coach and kit to decide. */
		setPlaces: integer('set_places'),
		/** The series that this one continues after "this and following". */
		splitFromId: integer('split_from_id'),
		clashesAllowed: text('clashes_allowed', { mode: 'json' })
			.$type<AllowedClash[]>()
			.notNull()
			.default([]),
		endedAt: instant('ended_at'),
		version: integer('version').notNull().default(1),
		createdAt: instant('created_at').notNull(),
		createdById: integer('created_by_id').references(() => people.id)
	},
	(t) => [
		index('series_class_type').on(t.classTypeId),
		check('series_length', sql`${t.lengthMin} between 5 and 480`)
	]
);

export const seriesCoaches = sqliteTable(
	'series_coaches',
	{
		seriesId: integer('series_id')
			.notNull()
			.references(() => series.id),
		personId: integer('person_id')
			.notNull()
			.references(() => people.id),
		position: integer('position').notNull().default(0)
	},
	(t) => [primaryKey({ columns: [t.seriesId, t.personId] })]
);

/** One dated class, private session or open-gym hour. */
export const slots = sqliteTable(
	'slots',
	{
		id: rowId(),
		/** Opaque and random: the iCalendar UID's left side. */
		uid: text('uid').notNull(),
		seriesId: integer('series_id').references(() => series.id),
		/** The original local start "YYYY-MM-DDTHH:MM": the recurrence key, kept when the slot moves. */
		recurrenceKey: text('recurrence_key'),
		kind: text('kind', { enum: ['class', 'private', 'open-gym'] })
			.notNull()
			.default('class'),
		classTypeId: integer('class_type_id')
			.notNull()
			.references(() => classTypes.id),
		roomId: integer('room_id')
			.notNull()
			.references(() => rooms.id),
		/** The gym's civil date and wall-clock start; `startsAt` is the instant it means. */
		startsOn: text('starts_on').notNull(),
		startTime: text('start_time').notNull(),
		startsAt: instant('starts_at').notNull(),
		endsAt: instant('ends_at').notNull(),
		setPlaces: integer('set_places'),
		/** Changed by hand: edits to the whole series leave it alone. */
		changedAt: instant('changed_at'),
		sessionRevisionId: integer('session_revision_id').references(() => sessionRevisions.id),
		laidAt: instant('laid_at'),
		sessionPublishedAt: instant('session_published_at'),
		cancelledAt: instant('cancelled_at'),
		cancelledById: integer('cancelled_by_id').references(() => people.id),
		cancelReason: text('cancel_reason'),
		/** RFC 5545 SEQUENCE: raised by each change that a subscriber must notice. */
		sequence: integer('sequence').notNull().default(0),
		modifiedAt: instant('modified_at').notNull(),
		createdAt: instant('created_at').notNull()
	},
	(t) => [
		uniqueIndex('slots_uid').on(t.uid),
		uniqueIndex('slots_recurrence').on(t.seriesId, t.recurrenceKey),
		index('slots_starts_at').on(t.startsAt),
		index('slots_room').on(t.roomId, t.startsAt),
		index('slots_revision').on(t.sessionRevisionId),
		check(
			'slots_order',
			sql`${t.endsAt} > ${t.startsAt} and ${t.endsAt} <= ${t.startsAt} + 43200000`
		),
		check('slots_key', sql`(${t.seriesId} is null) = (${t.recurrenceKey} is null)`),
		check(
			'slots_published',
			sql`${t.sessionPublishedAt} is null or ${t.sessionRevisionId} is not null`
		)
	]
);

export const slotCoaches = sqliteTable(
	'slot_coaches',
	{
		slotId: integer('slot_id')
			.notNull()
			.references(() => slots.id),
		personId: integer('person_id')
			.notNull()
			.references(() => people.id),
		position: integer('position').notNull().default(0)
	},
	(t) => [
		primaryKey({ columns: [t.slotId, t.personId] }),
		index('slot_coaches_person').on(t.personId)
	]
);

/** A clash that somebody allowed: without this row the triggers refuse two slots in one room, or one coach in two. */
export const clashOverrides = sqliteTable(
	'clash_overrides',
	{
		id: rowId(),
		/** The slot's uid, so that the override can be written in the transaction before the slot itself. */
		slotUid: text('slot_uid').notNull(),
		kind: text('kind', { enum: ['room', 'coach'] }).notNull(),
		why: text('why').notNull(),
		at: instant('at').notNull(),
		byId: integer('by_id')
			.notNull()
			.references(() => people.id)
	},
	(t) => [uniqueIndex('clash_overrides_slot').on(t.slotUid, t.kind)]
);

/** Civil days, both included, on which the gym or one room is shut. */
export const closures = sqliteTable(
	'closures',
	{
		id: rowId(),
		roomId: integer('room_id').references(() => rooms.id),
		fromOn: text('from_on').notNull(),
		toOn: text('to_on').notNull(),
		why: text('why').notNull(),
		createdAt: instant('created_at').notNull(),
		createdById: integer('created_by_id').references(() => people.id),
		endedAt: instant('ended_at')
	},
	(t) => [check('closures_order', sql`${t.toOn} >= ${t.fromOn}`)]
);

/** A week whose sessions were shown to members: who and when. */
export const publications = sqliteTable(
	'publications',
	{
		id: rowId(),
		weekOn: text('week_on').notNull(),
		at: instant('at').notNull(),
		byId: integer('by_id')
			.notNull()
			.references(() => people.id),
		slots: integer('slots').notNull(),
		isRepeat: flag('is_repeat')
	},
	(t) => [index('publications_week').on(t.weekOn)]
);
