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
import { rooms } from './gym';

/** A kind of piece: "Kettlebell". What a need asks for. */
export const kitGroups = sqliteTable(
	'kit_groups',
	{
		id: rowId(),
		/** One piece: "kettlebell", "pull-up bar place". */
		name: text('name').notNull(),
		plural: text('plural').notNull(),
		/** Whether pieces differ by load; then every item states one (planning.md, refusal `loads`). */
		hasLoads: flag('has_loads'),
		position: integer('position').notNull().default(0),
		archivedAt: instant('archived_at'),
		createdAt: instant('created_at').notNull()
	},
	(t) => [uniqueIndex('kit_groups_name').on(t.name)]
);

/** One row a group, load and home; that index is in the migration `invariants`, as drizzle-kit cannot write it. */
export const kitItems = sqliteTable(
	'kit_items',
	{
		id: rowId(),
		kitGroupId: integer('kit_group_id')
			.notNull()
			.references(() => kitGroups.id),
		loadKg: real('load_kg'),
		count: integer('count').notNull(),
		/** Its home; null when the site shares it. */
		roomId: integer('room_id').references(() => rooms.id),
		note: text('note'),
		archivedAt: instant('archived_at'),
		createdAt: instant('created_at').notNull()
	},
	(t) => [
		index('kit_items_group').on(t.kitGroupId),
		check('kit_items_count', sql`${t.count} between 0 and 1000`),
		check('kit_items_load', sql`${t.loadKg} is null or (${t.loadKg} > 0 and ${t.loadKg} <= 500)`)
	]
);

/** Pieces out of service: from, to (null while it lasts), how many, why. */
export const kitSpells = sqliteTable(
	'kit_spells',
	{
		id: rowId(),
		kitItemId: integer('kit_item_id')
			.notNull()
			.references(() => kitItems.id),
		count: integer('count').notNull(),
		fromAt: instant('from_at').notNull(),
		toAt: instant('to_at'),
		why: text('why').notNull(),
		createdAt: instant('created_at').notNull(),
		createdById: integer('created_by_id')
	},
	(t) => [
		index('kit_spells_item').on(t.kitItemId),
		check('kit_spells_count', sql`${t.count} >= 1`),
		check('kit_spells_order', sql`${t.toAt} is null or ${t.toAt} > ${t.fromAt}`)
	]
);
