import { RateLimiterMemory, type RateLimiterAbstract } from 'rate-limiter-flexible';

const quarterHourS = 15 * 60;
const limiter = (keyPrefix: string, points: number, duration: number) =>
	new RateLimiterMemory({ keyPrefix, points, duration });

/** Wrong passwords for one account: goal G19 of our reliability figures. */
const guessesByAccount = limiter('guess-account', 10, quarterHourS);
/** Wrong passwords from one address: a whole gym may sit behind it (common practice, no source). */
const guessesByAddress = limiter('guess-address', 100, quarterHourS);
/** Mail to one account, and asked for from one address. */
const linksByAccount = limiter('link-account', 5, quarterHourS);
const linksByAddress = limiter('link-address', 60, quarterHourS);
/** New accounts from one address: a whole class may sign up at the desk's wifi. */
const signUpsByAddress = limiter('sign-up-address', 60, 3600);
/** Guesses at the code that the log printed. */
const firstRuns = limiter('first-run', 10, quarterHourS);

/**
 * Takes a guess before the password is hashed, so that guesses made at once count too.
 * Null when too many failed; else call `forgive` if it was right: successes never count.
 */
export async function takeGuess(
	account: string,
	address: string
): Promise<{ forgive: () => Promise<void> } | null> {
	if (!(await take(guessesByAddress, address))) return null;
	if (!(await take(guessesByAccount, account))) return null;
	return {
		forgive: async () => {
			await guessesByAccount.reward(account);
			await guessesByAddress.reward(address);
		}
	};
}

export const mayAskForLink = async (account: string, address: string): Promise<boolean> =>
	(await take(linksByAddress, address)) && (await take(linksByAccount, account));

export const maySignUp = (address: string): Promise<boolean> => take(signUpsByAddress, address);

export const mayTryFirstRun = (): Promise<boolean> => take(firstRuns, 'code');

const take = (from: RateLimiterAbstract, key: string): Promise<boolean> =>
	from.consume(key).then(
		() => true,
		() => false
	);
