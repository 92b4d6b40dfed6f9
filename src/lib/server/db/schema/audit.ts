import { index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { instant, rowId } from './columns';
import { people } from './people';

/** Who did what to which row, and when. Append-only. */
export const auditEntries = sqliteTable(
	'audit_entries',
	{
		id: rowId(),
		at: instant('at').notNull(),
		actorId: integer('actor_id').references(() => people.id),
		/** The command: "kit.add-item", "slots.lay". */
		verb: text('verb').notNull(),
		/** Table and row that it acted on. */
		noun: text('noun').notNull(),
		nounId: integer('noun_id'),
		detail: text('detail', { mode: 'json' }).$type<Record<string, unknown>>().notNull().default({})
	},
	(t) => [
		index('audit_entries_at').on(t.at),
		index('audit_entries_noun').on(t.noun, t.nounId),
		index('audit_entries_actor').on(t.actorId)
	]
);
