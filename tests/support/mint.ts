import { randomBytes } from 'node:crypto';
import { encode } from '@auth/core/jwt';
import { write } from '../../src/lib/server/db';
import { signIns } from '../../src/lib/server/db/schema';

/** The secret and the cookie of a server that `startServer` starts. */
const secret = 'only-for-tests-only-for-tests-only';
const cookie = 'kithour.sign-in';
const hourMs = 3_600_000;

/**
 * Signs people in without a password: five hundred hashes would take minutes. The rows and the
 * tokens are what signing in makes.
 * @returns a `cookie` header for each person, in their order
 */
export async function mintSignIns(personIds: readonly number[]): Promise<string[]> {
	const now = Date.now();
	const rows = personIds.map((personId) => ({
		id: randomBytes(32).toString('base64url'),
		personId,
		createdAt: now,
		lastSeenAt: now,
		expiresAt: now + 8 * hourMs,
		userAgent: null,
		address: '127.0.0.1'
	}));
	await write((tx) => tx.insert(signIns).values(rows));
	return Promise.all(
		rows.map(async ({ id, personId }) => {
			const token = { sub: String(personId), sid: id };
			const value = await encode({ token, secret, salt: cookie, maxAge: 8 * 3600 });
			return `${cookie}=${encodeURIComponent(value)}`;
		})
	);
}
