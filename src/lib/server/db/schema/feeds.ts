import { index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';
import { instant, rowId } from './columns';
import { people } from './people';

/** A secret calendar address; only its hash is kept. */
export const feeds = sqliteTable(
	'feeds',
	{
		id: rowId(),
		kind: text('kind', { enum: ['member', 'coach', 'public'] }).notNull(),
		personId: integer('person_id').references(() => people.id),
		/** The device it is for, in its owner's words. */
		name: text('name').notNull(),
		tokenHash: text('token_hash').notNull(),
		createdAt: instant('created_at').notNull(),
		createdById: integer('created_by_id').references(() => people.id),
		lastReadAt: instant('last_read_at'),
		revokedAt: instant('revoked_at')
	},
	(t) => [uniqueIndex('feeds_token').on(t.tokenHash), index('feeds_person').on(t.personId)]
);
