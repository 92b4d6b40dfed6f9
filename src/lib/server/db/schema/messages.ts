import { index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';
import { instant, rowId } from './columns';
import { people } from './people';

/** Mail to be sent, written in the transaction of the fact that causes it. */
export const outboxMessages = sqliteTable(
	'outbox_messages',
	{
		id: rowId(),
		kind: text('kind').notNull(),
		/** One message a fact: "sign-in-link:HASH", "booking:42:promoted". */
		factKey: text('fact_key').notNull(),
		personId: integer('person_id').references(() => people.id),
		toAddress: text('to_address').notNull(),
		subject: text('subject').notNull(),
		text: text('text').notNull(),
		html: text('html').notNull(),
		/** An iCalendar body to attach, with its METHOD. */
		calendar: text('calendar'),
		calendarMethod: text('calendar_method'),
		messageId: text('message_id').notNull(),
		createdAt: instant('created_at').notNull(),
		nextAttemptAt: instant('next_attempt_at').notNull(),
		attempts: integer('attempts').notNull().default(0),
		claimedAt: instant('claimed_at'),
		sentAt: instant('sent_at'),
		failedAt: instant('failed_at'),
		lastError: text('last_error')
	},
	(t) => [
		uniqueIndex('outbox_messages_fact').on(t.factKey),
		index('outbox_messages_due').on(t.sentAt, t.failedAt, t.nextAttemptAt)
	]
);
