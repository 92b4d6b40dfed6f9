import { createHash } from 'node:crypto';
import { and, eq, lt } from 'drizzle-orm';
import { write } from '../db';
import { signInLinks } from '../db/schema';

/** Long enough to find the mail, short enough that a lost inbox matters little. */
export const linkLastsS = 20 * 60;

/** Hashed once more than Auth.js does: what the table holds opens nothing. */
const hashed = (token: string) => createHash('sha256').update(token).digest('hex');

export type Link = { identifier: string; token: string; expires: Date };

export async function keepLink({ identifier, token, expires }: Link, now: number): Promise<void> {
	await write(async (tx) => {
		await tx.delete(signInLinks).where(lt(signInLinks.expiresAt, now));
		await tx.insert(signInLinks).values({
			tokenHash: hashed(token),
			email: identifier,
			expiresAt: expires.getTime(),
			createdAt: now
		});
	});
}

/** Takes the link away in the same step that reads it, so that two clicks at once open one door. */
export async function useLink(
	identifier: string,
	token: string,
	now: number
): Promise<Link | null> {
	const [used] = await write((tx) =>
		tx
			.delete(signInLinks)
			.where(and(eq(signInLinks.tokenHash, hashed(token)), eq(signInLinks.email, identifier)))
			.returning()
	);
	return used && now < used.expiresAt
		? { identifier, token, expires: new Date(used.expiresAt) }
		: null;
}
