import { hash, verify } from '@node-rs/argon2';
import { atMost } from './at-most';

/** Argon2id at 19 MiB, two passes, one lane: the least that OWASP's password sheet asks (from memory). */
const cost = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** Two at a time, so that a storm of guesses leaves the machine able to answer everybody else. */
const inTurn = atMost(2, 200);

export const hashPassword = (password: string): Promise<string> =>
	inTurn(() => hash(password, cost));

/** Takes as long for an account without a password, or for none at all, as for a wrong guess. */
export async function isPassword(stored: string | null, guess: string): Promise<boolean> {
	const against = stored ?? (await nobodys());
	const matches = await inTurn(() => verify(against, guess).catch(() => false));
	return stored !== null && matches;
}

let decoy: Promise<string> | null = null;
const nobodys = () => (decoy ??= hashPassword(crypto.randomUUID()));

/** Made when the process comes up, so that the first unknown name is not the slow one. */
export const prepareDecoy = (): Promise<unknown> => nobodys();
