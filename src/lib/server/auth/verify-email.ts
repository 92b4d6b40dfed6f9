import { eq } from 'drizzle-orm';
import { write } from '../db';
import { people } from '../db/schema';
import { revokeSignInsOf } from './revoke';

/**
 * Notes that a person opened a link sent to their address. The first time, a password and
 * sign-ins that somebody else may have set up on that address beforehand end, unless it is
 * the same person's browser (`signedInAs`) that opens the link.
 */
export async function verifyEmail(
	personId: number,
	{ now, signedInAs }: { now: number; signedInAs: number | null }
): Promise<void> {
	await write(async (tx) => {
		const [person] = await tx
			.select({ verifiedAt: people.emailVerifiedAt })
			.from(people)
			.where(eq(people.id, personId));
		if (!person || person.verifiedAt !== null) return;
		if (signedInAs === personId) {
			await tx.update(people).set({ emailVerifiedAt: now }).where(eq(people.id, personId));
			return;
		}
		await tx
			.update(people)
			.set({ emailVerifiedAt: now, passwordHash: null })
			.where(eq(people.id, personId));
		await revokeSignInsOf(tx, personId, now);
	});
}
