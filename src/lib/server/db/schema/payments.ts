import { index, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { instant } from './columns';

/** What the payment service told, as it was told, once an event: acted on from here, never twice. */
export const stripeEvents = sqliteTable(
	'stripe_events',
	{
		/** The service's own id: "evt_...". */
		id: text('id').primaryKey(),
		type: text('type').notNull(),
		/** When it happened, by the service's clock; events arrive in any order. */
		happenedAt: instant('happened_at').notNull(),
		payload: text('payload').notNull(),
		receivedAt: instant('received_at').notNull(),
		/** Null until something acted on it. */
		actedAt: instant('acted_at')
	},
	(t) => [index('stripe_events_to_act').on(t.actedAt, t.happenedAt)]
);
