import { eq } from 'drizzle-orm';
import type { Role } from '../../src/lib/domain/people/capabilities';
import { hashPassword } from '../../src/lib/server/auth/password';
import { write, type Tx } from '../../src/lib/server/db';
import { gyms, people, personRoles } from '../../src/lib/server/db/schema';

export const testPassword = 'a password for tests';

let hash: Promise<string> | null = null;

/** The one gym of the specs, made unless it is there. */
export async function addGym(tx: Tx, now = 1): Promise<void> {
	const [there] = await tx.select({ id: gyms.id }).from(gyms).where(eq(gyms.id, 1));
	if (there) return;
	await tx.insert(gyms).values({
		id: 1,
		name: 'Ropewalk Strength',
		placeName: 'Galway',
		zone: 'Europe/Dublin',
		currency: 'EUR',
		createdAt: now
	});
}

/** A person with these roles, whose password is `testPassword`; returns their id. */
export async function addPerson(email: string, roles: Role[], now = 1): Promise<number> {
	hash ??= hashPassword(testPassword);
	const passwordHash = await hash;
	return write(async (tx) => {
		await addGym(tx, now);
		const [person] = await tx
			.insert(people)
			.values({
				name: email.split('@')[0] ?? email,
				email,
				passwordHash,
				emailVerifiedAt: now,
				createdAt: now
			})
			.returning({ id: people.id });
		if (!person) throw new Error('no row');
		for (const role of roles) {
			await tx.insert(personRoles).values({ personId: person.id, role, grantedAt: now });
		}
		return person.id;
	});
}
