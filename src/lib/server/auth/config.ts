import type { AuthConfig } from '@auth/core';
import { CredentialsSignin } from '@auth/core/errors';
import Credentials from '@auth/core/providers/credentials';
import type { RequestEvent } from '@sveltejs/kit';
import { env } from '../env';
import { log } from '../log';
import { authAdapter } from './adapter';
import { clientAddress } from './address';
import { checkPassword } from './check-password';
import { authCookies } from './cookie';
import { emailProvider, linkAnswers, mayReceiveLink } from './email-link';
import { recordSignIn } from './record-sign-in';
import { returnPath } from './return-path';
import { signOut } from './revoke';

/** The cookie outlives every sign-in; the row decides. */
const cookieLastsS = 60 * 24 * 3600;

export class Refusal extends CredentialsSignin {
	constructor(public override code: string) {
		super(code);
	}
}

/**
 * Auth.js for one request. Its token carries a person and a sign-in and nothing else:
 * roles and names are loaded from the rows at each request.
 */
export function authConfig(
	event: Pick<RequestEvent, 'locals' | 'request' | 'getClientAddress'>
): AuthConfig {
	const { now, viewer } = event.locals;
	const address = clientAddress(event);
	const device = { userAgent: event.request.headers.get('user-agent'), address };

	return {
		secret: env().authSecret,
		trustHost: true,
		basePath: '/auth',
		useSecureCookies: env().origin.startsWith('https:'),
		cookies: authCookies(),
		session: { strategy: 'jwt', maxAge: cookieLastsS },
		pages: {
			signIn: '/sign-in',
			signOut: '/',
			error: '/sign-in',
			verifyRequest: '/sign-in?sent=1'
		},
		adapter: authAdapter({ now, signedInAs: viewer?.personId ?? null }),
		providers: [
			Credentials({
				credentials: { email: {}, password: {} },
				async authorize({ email, password }) {
					const known = await checkPassword(lowerCase(email), asText(password), address);
					if (!known.ok) throw new Refusal(known.refused);
					return { id: String(known.personId) };
				}
			}),
			emailProvider({ now })
		],
		callbacks: {
			signIn: ({ user, email }) =>
				email?.verificationRequest ? mayReceiveLink(user.email, address) : true,
			redirect: ({ url, baseUrl }) =>
				linkAnswers.includes(url) ? baseUrl + url : withinSite(url, baseUrl),
			async jwt({ token, user }) {
				if (!user) return viewer && token.sid === viewer.signInId ? token : null;
				const replaces = viewer?.signInId ?? null;
				const sid = await recordSignIn(Number(user.id), device, { now, replaces });
				return { sub: user.id, sid };
			},
			session: ({ session }) => ({
				expires: session.expires,
				user: { id: String(viewer?.personId), name: viewer?.name, email: viewer?.email }
			})
		},
		events: {
			async signOut(ended) {
				const token = 'token' in ended ? ended.token : null;
				if (typeof token?.sid === 'string') await signOut(token.sid, now);
			}
		},
		logger: {
			error: (error) => logged(error),
			warn: () => undefined,
			debug: () => undefined
		}
	};
}

const asText = (value: unknown): string => (typeof value === 'string' ? value : '');
export const lowerCase = (value: unknown): string => asText(value).trim().toLowerCase();

/** Auth.js hands in whole addresses and paths; what is not a path of ours becomes the start page. */
export function withinSite(url: string, origin: string): string {
	const path = url.startsWith(origin) ? url.slice(origin.length) || '/' : url;
	return origin + returnPath(path, '/');
}

/** A refused guess is everyday life, not a fault. */
function logged(error: Error): void {
	if (error instanceof CredentialsSignin || error.name === 'Verification') return;
	log.warn({ kind: error.name, cause: causeOf(error) }, 'sign-in failed');
}

const causeOf = (error: Error) => {
	const inner = error.cause && typeof error.cause === 'object' && 'err' in error.cause;
	return inner && error.cause instanceof Object
		? String((error.cause as { err: unknown }).err)
		: undefined;
};
