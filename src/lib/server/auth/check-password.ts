import { eq } from 'drizzle-orm';
import { refuse, type Refused } from '$lib/domain/refusal';
import { db } from '../db';
import { people } from '../db/schema';
import { TooManyWaiting } from './at-most';
import { takeGuess } from './limits';
import { isPassword } from './password';

/** Longer ones are nobody's password and would only make the hash work. */
const longestPassword = 200;

export type Known = { ok: true; personId: number };

/**
 * Whether `password` is that of the account `email` (lower case). The same refusal, in the same
 * time, for a wrong password, an unknown or shut account and one that has no password.
 */
export async function checkPassword(
	email: string,
	password: string,
	address: string
): Promise<Known | Refused<'wrong-password' | 'too-many-tries'>> {
	if (email === '' || password === '' || password.length > longestPassword) {
		return refuse('wrong-password');
	}
	const guess = await takeGuess(email, address);
	if (!guess) return refuse('too-many-tries');

	const [person] = await db
		.select({ id: people.id, hash: people.passwordHash, disabledAt: people.disabledAt })
		.from(people)
		.where(eq(people.email, email));
	const matches = await isPassword(person?.hash ?? null, password).catch(whenCrowded);
	if (matches === 'crowded') return refuse('too-many-tries');
	if (!person || !matches || person.disabledAt !== null) return refuse('wrong-password');

	await guess.forgive();
	return { ok: true, personId: person.id };
}

function whenCrowded(error: unknown): 'crowded' {
	if (error instanceof TooManyWaiting) return 'crowded';
	throw error;
}
