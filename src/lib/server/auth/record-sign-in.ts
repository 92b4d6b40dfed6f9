import { randomBytes } from 'node:crypto';
import { eq } from 'drizzle-orm';
import { signInLimits } from '$lib/domain/people/sign-in';
import { write } from '../db';
import { personRoles, signIns } from '../db/schema';
import { revokeSignIn } from './revoke';

export type Device = { userAgent: string | null; address: string };

/**
 * Starts a sign-in with a new id, always: what a cookie said before signing in ends here.
 * `replaces` is the sign-in that the same browser held.
 */
export async function recordSignIn(
	personId: number,
	device: Device,
	{ now, replaces }: { now: number; replaces: string | null }
): Promise<string> {
	const id = randomBytes(32).toString('base64url');
	await write(async (tx) => {
		const held = await tx
			.select({ role: personRoles.role })
			.from(personRoles)
			.where(eq(personRoles.personId, personId));
		const { longestMs } = signInLimits(held.map((row) => row.role));
		if (replaces) await revokeSignIn(tx, replaces, now);
		await tx.insert(signIns).values({
			id,
			personId,
			createdAt: now,
			lastSeenAt: now,
			expiresAt: now + longestMs,
			userAgent: device.userAgent?.slice(0, 300) ?? null,
			address: device.address
		});
	});
	return id;
}
