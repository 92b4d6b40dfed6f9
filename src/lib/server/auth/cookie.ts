import { decode } from '@auth/core/jwt';
import { env } from '../env';

const isSecure = () => env().origin.startsWith('https:');

/** Bound to this host alone where the connection allows it. The name is also the token's salt. */
export const signInCookie = () => (isSecure() ? '__Host-kithour.sign-in' : 'kithour.sign-in');

/** Every cookie of Auth.js, under our own names. */
export function authCookies() {
	const named = (name: string) => ({ name, options: cookieOptions() });
	const prefix = isSecure() ? '__Host-' : '';
	return {
		sessionToken: named(signInCookie()),
		callbackUrl: named(`${prefix}kithour-to`),
		csrfToken: named(`${prefix}kithour-csrf`)
	};
}

const cookieOptions = () => ({
	httpOnly: true,
	sameSite: 'lax' as const,
	path: '/',
	secure: isSecure()
});

/** What the cookie says: a person and one of their sign-ins. Only the row decides whether it counts. */
export type Claim = { personId: number; signInId: string };

/** Null for no cookie, a forged or an outdated one. */
export async function readClaim(cookie: string | undefined): Promise<Claim | null> {
	if (!cookie) return null;
	try {
		const token = await decode({ token: cookie, secret: env().authSecret, salt: signInCookie() });
		return token?.sub && typeof token.sid === 'string'
			? { personId: Number(token.sub), signInId: token.sid }
			: null;
	} catch {
		return null;
	}
}
