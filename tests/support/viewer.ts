import { eq } from 'drizzle-orm';
import { capabilitiesOf } from '../../src/lib/domain/people/capabilities';
import { db } from '../../src/lib/server/db';
import { people, personRoles } from '../../src/lib/server/db/schema';
import type { Viewer } from '../../src/lib/server/guard';

/** A viewer as a request would have loaded them, for tests of commands. */
export async function viewerOf(personId: number): Promise<Viewer> {
	const [person] = await db.select().from(people).where(eq(people.id, personId));
	if (!person) throw new Error(`no person ${personId}`);
	const rows = await db.select().from(personRoles).where(eq(personRoles.personId, personId));
	const roles = rows.map((row) => row.role);
	return {
		personId,
		name: person.name,
		email: person.email,
		roles,
		capabilities: capabilitiesOf(roles),
		signInId: `sign-in-of-${personId}`
	};
}
