import type { Adapter, AdapterUser } from '@auth/core/adapters';
import { eq } from 'drizzle-orm';
import { db } from '../db';
import { people } from '../db/schema';
import { keepLink, useLink } from './links';
import { verifyEmail } from './verify-email';

/** What Auth.js needs of the database for e-mailed links; every write goes through `write()`. */
export function authAdapter(asked: { now: number; signedInAs: number | null }): Adapter {
	return {
		getUserByEmail: (email) => findUser(eq(people.email, email)),
		getUser: (id) => findUser(eq(people.id, Number(id))),
		async updateUser({ id }) {
			await verifyEmail(Number(id), asked);
			const user = await findUser(eq(people.id, Number(id)));
			if (!user) throw new Error('the person is gone');
			return user;
		},
		createUser() {
			throw new Error('people are made by sign-up and by staff, never by a link');
		},
		async createVerificationToken(link) {
			await keepLink(link, asked.now);
			return link;
		},
		useVerificationToken: ({ identifier, token }) => useLink(identifier, token, asked.now)
	};
}

async function findUser(where: ReturnType<typeof eq>): Promise<AdapterUser | null> {
	const [person] = await db
		.select({ id: people.id, name: people.name, email: people.email, at: people.emailVerifiedAt })
		.from(people)
		.where(where);
	if (!person?.email) return null;
	return {
		id: String(person.id),
		name: person.name,
		email: person.email,
		emailVerified: person.at === null ? null : new Date(person.at)
	};
}
