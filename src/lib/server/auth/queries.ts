import { eq } from 'drizzle-orm';
import type { Role } from '$lib/domain/people/capabilities';
import { db, type Queryable } from '../db';
import { people, personRoles, signIns } from '../db/schema';

export type FoundSignIn = {
	personId: number;
	name: string;
	email: string | null;
	theme: 'light' | 'dark' | null;
	disabledAt: number | null;
	lastSeenAt: number;
	expiresAt: number;
	revokedAt: number | null;
	roles: Role[];
};

/** One device with its person and their roles as they stand now. */
export async function findSignIn(id: string, q: Queryable = db): Promise<FoundSignIn | null> {
	const rows = await q
		.select({
			personId: people.id,
			name: people.name,
			email: people.email,
			theme: people.theme,
			disabledAt: people.disabledAt,
			lastSeenAt: signIns.lastSeenAt,
			expiresAt: signIns.expiresAt,
			revokedAt: signIns.revokedAt,
			role: personRoles.role
		})
		.from(signIns)
		.innerJoin(people, eq(people.id, signIns.personId))
		.leftJoin(personRoles, eq(personRoles.personId, people.id))
		.where(eq(signIns.id, id));
	const [first] = rows;
	if (!first) return null;
	const { role: _, ...found } = first;
	return { ...found, roles: rows.flatMap((row) => (row.role ? [row.role] : [])) };
}
