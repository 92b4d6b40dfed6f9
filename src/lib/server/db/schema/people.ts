import {
	index,
	integer,
	primaryKey,
	sqliteTable,
	text,
	uniqueIndex
} from 'drizzle-orm/sqlite-core';
import { roles } from '../../../domain/people/capabilities';
import { instant, rowId } from './columns';

export const people = sqliteTable(
	'people',
	{
		id: rowId(),
		name: text('name').notNull(),
		/** Lower case; null for somebody the desk booked without an address. */
		email: text('email'),
		phone: text('phone'),
		passwordHash: text('password_hash'),
		emailVerifiedAt: instant('email_verified_at'),
		/** What a coach should know, in the member's own words. */
		note: text('note'),
		theme: text('theme', { enum: ['light', 'dark'] }),
		disabledAt: instant('disabled_at'),
		createdAt: instant('created_at').notNull(),
		createdById: integer('created_by_id')
	},
	(t) => [uniqueIndex('people_email').on(t.email), index('people_name').on(t.name)]
);

export const personRoles = sqliteTable(
	'person_roles',
	{
		personId: integer('person_id')
			.notNull()
			.references(() => people.id),
		role: text('role', { enum: roles }).notNull(),
		grantedAt: instant('granted_at').notNull(),
		grantedById: integer('granted_by_id').references(() => people.id)
	},
	(t) => [primaryKey({ columns: [t.personId, t.role] }), index('person_roles_role').on(t.role)]
);

/** One signed-in device. The cookie carries `id`; the row decides whether it still counts. */
export const signIns = sqliteTable(
	'sign_ins',
	{
		id: text('id').primaryKey(),
		personId: integer('person_id')
			.notNull()
			.references(() => people.id),
		createdAt: instant('created_at').notNull(),
		lastSeenAt: instant('last_seen_at').notNull(),
		expiresAt: instant('expires_at').notNull(),
		revokedAt: instant('revoked_at'),
		userAgent: text('user_agent'),
		address: text('address')
	},
	(t) => [index('sign_ins_person').on(t.personId)]
);

/** An e-mailed link, kept as a hash: works once, then or at its expiry it is gone. */
export const signInLinks = sqliteTable(
	'sign_in_links',
	{
		tokenHash: text('token_hash').primaryKey(),
		email: text('email').notNull(),
		expiresAt: instant('expires_at').notNull(),
		createdAt: instant('created_at').notNull()
	},
	(t) => [index('sign_in_links_email').on(t.email)]
);
