import { eq } from 'drizzle-orm';
import { isWeakPassword } from '$lib/domain/people/password';
import { refuse, type Refused } from '$lib/domain/refusal';
import type { SignUp } from '$lib/forms/sign-up';
import { hashPassword } from '../auth/password';
import { write } from '../db';
import { people, personRoles } from '../db/schema';
import type { Gym } from '../gym/queries';

/**
 * Makes a member. The address counts as theirs once they open a link sent to it; a password
 * set before by somebody else ends then.
 */
export async function signUp(
	{ name, email, password }: SignUp,
	{ gym, now }: { gym: Gym; now: number }
): Promise<{ ok: true; personId: number } | Refused<'email-taken' | 'weak-password'>> {
	if (password && isWeakPassword(password, [name, email, gym.name])) {
		return refuse('weak-password');
	}
	const passwordHash = password ? await hashPassword(password) : null;
	return write(async (tx) => {
		const [taken] = await tx.select({ id: people.id }).from(people).where(eq(people.email, email));
		if (taken) return refuse('email-taken');
		const [person] = await tx
			.insert(people)
			.values({ name, email, passwordHash, createdAt: now })
			.returning({ id: people.id });
		if (!person) throw new Error('the person was not written');
		await tx.insert(personRoles).values({ personId: person.id, role: 'member', grantedAt: now });
		return { ok: true, personId: person.id };
	});
}
