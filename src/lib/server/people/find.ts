import { and, asc, eq, isNull } from 'drizzle-orm';
import { db } from '../db';
import { people, personRoles } from '../db/schema';

export type FoundPerson = { id: number; name: string; email: string | null; phone: string | null };

/** SQLite's own LIKE knows no accents: both sides are folded in JavaScript. */
const folded = (text: string) => text.normalize('NFD').replace(/\p{M}/gu, '').toLowerCase();

/** Members whose name or address has every word of `sought`, accents forgiven; the first fifty by name. */
export async function findMembers(sought: string): Promise<FoundPerson[]> {
	const words = folded(sought).split(/\s+/).filter(Boolean);
	const rows = await db
		.select({ id: people.id, name: people.name, email: people.email, phone: people.phone })
		.from(people)
		.innerJoin(
			personRoles,
			and(eq(personRoles.personId, people.id), eq(personRoles.role, 'member'))
		)
		.where(isNull(people.disabledAt))
		.orderBy(asc(people.name));
	return rows
		.filter(({ name, email }) =>
			words.every((word) => folded(`${name} ${email ?? ''}`).includes(word))
		)
		.slice(0, 50);
}
