import { sql } from 'drizzle-orm';
import {
	check,
	index,
	integer,
	primaryKey,
	real,
	sqliteTable,
	text,
	uniqueIndex
} from 'drizzle-orm/sqlite-core';
import { flag, instant, rowId } from './columns';
import { kitGroups } from './kit';

export const patterns = [
	'squat',
	'hinge',
	'horizontal push',
	'vertical push',
	'horizontal pull',
	'vertical pull',
	'lunge',
	'carry',
	'trunk',
	'conditioning',
	'mobility'
] as const;

export const movements = sqliteTable(
	'movements',
	{
		id: rowId(),
		name: text('name').notNull(),
		pattern: text('pattern', { enum: patterns }).notNull(),
		muscles: text('muscles', { mode: 'json' }).$type<string[]>().notNull(),
		perSide: flag('per_side'),
		secondsPerRep: real('seconds_per_rep').notNull(),
		cues: text('cues').notNull().default(''),
		cautions: text('cautions').notNull().default(''),
		/** Said out loud where no rung of the ladder is free of kit. */
		alwaysNeedsKit: flag('always_needs_kit'),
		version: integer('version').notNull().default(1),
		archivedAt: instant('archived_at'),
		createdAt: instant('created_at').notNull(),
		updatedAt: instant('updated_at').notNull()
	},
	(t) => [
		uniqueIndex('movements_name').on(t.name),
		index('movements_pattern').on(t.pattern),
		check('movements_seconds', sql`${t.secondsPerRep} > 0 and ${t.secondsPerRep} <= 120`)
	]
);

/** A rung of a movement's ladder; rung 0 is the hardest. */
export const variations = sqliteTable(
	'variations',
	{
		id: rowId(),
		movementId: integer('movement_id')
			.notNull()
			.references(() => movements.id),
		name: text('name').notNull(),
		rung: integer('rung').notNull(),
		note: text('note').notNull().default(''),
		archivedAt: instant('archived_at')
	},
	(t) => [
		uniqueIndex('variations_rung')
			.on(t.movementId, t.rung)
			.where(sql`${t.archivedAt} is null`),
		index('variations_movement').on(t.movementId)
	]
);

export const variationNeeds = sqliteTable(
	'variation_needs',
	{
		variationId: integer('variation_id')
			.notNull()
			.references(() => variations.id),
		kitGroupId: integer('kit_group_id')
			.notNull()
			.references(() => kitGroups.id),
		quantity: integer('quantity').notNull().default(1),
		peoplePerPiece: integer('people_per_piece').notNull().default(1)
	},
	(t) => [
		primaryKey({ columns: [t.variationId, t.kitGroupId] }),
		check('variation_needs_numbers', sql`${t.quantity} >= 1 and ${t.peoplePerPiece} >= 1`),
		check('variation_needs_sharing', sql`${t.quantity} = 1 or ${t.peoplePerPiece} = 1`)
	]
);
