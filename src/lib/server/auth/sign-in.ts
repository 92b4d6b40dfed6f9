import { Auth, raw, skipCSRFCheck } from '@auth/core';
import { AuthError, CredentialsSignin } from '@auth/core/errors';
import type { RequestEvent } from '@sveltejs/kit';
import { refuse, type Refused } from '$lib/domain/refusal';
import { env } from '../env';
import { authConfig } from './config';
import { signInCookie } from './cookie';

type SignedIn = { ok: true };

/** Signs in with a password, from one of our own forms: the cookie is set on `event`. */
export function signInByPassword(
	event: RequestEvent,
	typed: { email: string; password: string }
): Promise<SignedIn | Refused<'wrong-password' | 'too-many-tries'>> {
	return ask(event, '/auth/callback/credentials', { body: new URLSearchParams(typed) });
}

/** Signs in by the link of a mail; it works once. */
export function signInByLink(
	event: RequestEvent,
	link: { email: string; token: string }
): Promise<SignedIn | Refused<'link-spent'>> {
	return ask(event, `/auth/callback/email?${new URLSearchParams(link)}`, {});
}

/** Asks for a link by mail. The answer is the same whether the address has an account or not. */
export async function askForLink(
	event: RequestEvent,
	email: string,
	to: string
): Promise<SignedIn | Refused<'too-many-tries'>> {
	const body = new URLSearchParams({ email, callbackUrl: env().origin + to });
	const answer = await ask<'too-many-tries'>(event, '/auth/signin/email', { body });
	return answer;
}

async function ask<Code extends string>(
	event: RequestEvent,
	path: string,
	{ body }: { body?: URLSearchParams }
): Promise<SignedIn | Refused<Code>> {
	const held = event.cookies.get(signInCookie());
	const request = new Request(env().origin + path, {
		method: body ? 'POST' : 'GET',
		headers: held ? { cookie: `${signInCookie()}=${held}` } : {},
		body
	});
	try {
		const answer = await Auth(request, { ...authConfig(event), raw, skipCSRFCheck });
		const error = answer.redirect
			? new URL(answer.redirect, env().origin).searchParams.get('error')
			: null;
		if (error) return refuse(error as Code);
		for (const { name, value, options } of answer.cookies ?? []) {
			if (name === signInCookie()) event.cookies.set(name, value, { ...options, path: '/' });
		}
		return { ok: true };
	} catch (thrown) {
		if (thrown instanceof CredentialsSignin) return refuse(thrown.code as Code);
		if (thrown instanceof AuthError && thrown.type === 'Verification')
			return refuse('link-spent' as Code);
		throw thrown;
	}
}
