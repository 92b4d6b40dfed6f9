import { sql } from 'drizzle-orm';
import { check, index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';
import type { SessionContent } from '../../../domain/training/session';
import { instant, rowId } from './columns';
import { people } from './people';

export const programmes = sqliteTable(
	'programmes',
	{
		id: rowId(),
		name: text('name').notNull(),
		aim: text('aim').notNull().default(''),
		position: integer('position').notNull().default(0),
		archivedAt: instant('archived_at'),
		createdAt: instant('created_at').notNull()
	},
	(t) => [uniqueIndex('programmes_name').on(t.name)]
);

/** What is done in a class. Its content lives in immutable revisions; the highest number is the current one. */
export const trainingSessions = sqliteTable(
	'training_sessions',
	{
		id: rowId(),
		programmeId: integer('programme_id').references(() => programmes.id),
		title: text('title').notNull(),
		/** The class length it is written for. */
		lengthMin: integer('length_min').notNull(),
		revisionNumber: integer('revision_number').notNull().default(0),
		archivedAt: instant('archived_at'),
		createdAt: instant('created_at').notNull(),
		createdById: integer('created_by_id').references(() => people.id)
	},
	(t) => [
		index('training_sessions_programme').on(t.programmeId),
		check('training_sessions_length', sql`${t.lengthMin} between 5 and 480`)
	]
);

export const sessionRevisions = sqliteTable(
	'session_revisions',
	{
		id: rowId(),
		trainingSessionId: integer('training_session_id')
			.notNull()
			.references(() => trainingSessions.id),
		number: integer('number').notNull(),
		content: text('content', { mode: 'json' }).$type<SessionContent>().notNull(),
		createdAt: instant('created_at').notNull(),
		createdById: integer('created_by_id').references(() => people.id)
	},
	(t) => [uniqueIndex('session_revisions_number').on(t.trainingSessionId, t.number)]
);
