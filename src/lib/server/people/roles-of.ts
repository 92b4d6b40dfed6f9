import { eq } from 'drizzle-orm';
import type { Role } from '$lib/domain/people/capabilities';
import { db } from '../db';
import { people, personRoles } from '../db/schema';

/** The roles of the account with this address (lower case); none for nobody's. */
export async function rolesOfAccount(email: string): Promise<Role[]> {
	const rows = await db
		.select({ role: personRoles.role })
		.from(personRoles)
		.innerJoin(people, eq(people.id, personRoles.personId))
		.where(eq(people.email, email));
	return rows.map((row) => row.role);
}
