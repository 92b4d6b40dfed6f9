import { check, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';
import { sql } from 'drizzle-orm';
import { flag, instant, rowId } from './columns';

/** One row: the gym whose database this is. */
export const gyms = sqliteTable(
	'gyms',
	{
		id: integer('id').primaryKey(),
		name: text('name').notNull(),
		placeName: text('place_name').notNull(),
		zone: text('zone').notNull(),
		currency: text('currency').notNull(),
		locale: text('locale').notNull().default('en-IE'),
		loadUnit: text('load_unit', { enum: ['kg', 'lb'] })
			.notNull()
			.default('kg'),
		/** ISO 8601: 1 is Monday, 7 is Sunday. */
		weekStartsOn: integer('week_starts_on').notNull().default(1),
		/** Whether the gym's bells wear the colours of plates; decides the load chip. */
		bellsWearPlateColours: flag('bells_wear_plate_colours'),
		/** Raised by every change to movements, variations or kit groups, so that compiled ladders can be kept. */
		libraryVersion: integer('library_version').notNull().default(1),
		isDemo: flag('is_demo'),
		createdAt: instant('created_at').notNull()
	},
	(t) => [
		check('gyms_one_row', sql`${t.id} = 1`),
		check('gyms_week_start', sql`${t.weekStartsOn} between 1 and 7`)
	]
);

export const rooms = sqliteTable(
	'rooms',
	{
		id: rowId(),
		name: text('name').notNull(),
		/** The posted limit: everyone in the room, coaches too. */
		places: integer('places').notNull(),
		position: integer('position').notNull().default(0),
		archivedAt: instant('archived_at'),
		createdAt: instant('created_at').notNull()
	},
	(t) => [
		uniqueIndex('rooms_name').on(t.name),
		check('rooms_places', sql`${t.places} between 1 and 1000`)
	]
);
