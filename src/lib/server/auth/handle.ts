import { Auth, skipCSRFCheck } from '@auth/core';
import { error, redirect, type Handle, type RequestEvent } from '@sveltejs/kit';
import { refusalSentence } from '$lib/wording/refusals';
import { env } from '../env';
import { safeForm, safeJson } from '../safe-body';
import { authConfig, withinSite } from './config';
import { authCookies } from './cookie';

/** The addresses of Auth.js that exist here; anything else under /auth is not found. */
const posts = ['/auth/callback/credentials', '/auth/signin/email', '/auth/signout'];
const gets = ['/auth/csrf', '/auth/session', '/auth/providers'];
/** Its own pages, and ours in their stead. */
const pages: Record<string, string> = {
	'/auth/signin': '/sign-in',
	'/auth/error': '/sign-in',
	'/auth/verify-request': '/sign-in?sent=1',
	'/auth/signout': '/'
};
const fields = ['email', 'password', 'callbackUrl', 'csrfToken'];
const bodyLimit = 8 * 1024;

/**
 * Answers the addresses of Auth.js for clients that post to them directly. What it is given is
 * cleaned first: it answers 500 to odd callback addresses and bodies.
 */
export const answerAuth: Handle = async ({ event, resolve }) => {
	const { pathname, searchParams } = event.url;
	if (!pathname.startsWith('/auth/')) return resolve(event);

	if (event.request.method === 'POST') {
		if (!posts.includes(pathname)) missing();
		return post(event, await readFields(event));
	}
	if (event.request.method !== 'GET') missing('no-method');
	if (pathname === '/auth/callback/email') redirect(303, `/sign-in/link?${searchParams}`);
	const page = pages[pathname];
	if (page) redirect(303, page);
	if (!gets.includes(pathname)) missing();
	return Auth(cleanRequest(event), authConfig(event));
};

/** The origin was checked already; a token that a client sends along is checked as well. */
function post(event: RequestEvent, body: URLSearchParams): Promise<Response> {
	const config = authConfig(event);
	return Auth(
		cleanRequest(event, body),
		body.has('csrfToken') ? config : { ...config, skipCSRFCheck }
	);
}

async function readFields(event: RequestEvent): Promise<URLSearchParams> {
	const isJson = event.request.headers.get('content-type')?.startsWith('application/json');
	const given: [string, unknown][] = isJson
		? Object.entries((await safeJson(event, bodyLimit)) ?? {})
		: [...(await safeForm(event, bodyLimit))];
	const clean = new URLSearchParams();
	for (const [name, value] of given) {
		if (fields.includes(name) && typeof value === 'string') clean.set(name, value);
	}
	clean.set('callbackUrl', withinSite(clean.get('callbackUrl') ?? '/', env().origin));
	return clean;
}

/** The request under our own address, with our own cookies and no query. */
function cleanRequest(event: RequestEvent, body?: URLSearchParams): Request {
	const { sessionToken, csrfToken } = authCookies();
	const cookies = [sessionToken.name, csrfToken.name].flatMap((name) => {
		const value = event.cookies.get(name);
		return value === undefined ? [] : [`${name}=${encodeURIComponent(value)}`];
	});
	const headers = new Headers({ cookie: cookies.join('; ') });
	if (event.request.headers.has('x-auth-return-redirect')) {
		headers.set('x-auth-return-redirect', '1');
	}
	const url = env().origin + event.url.pathname;
	return new Request(url, { method: event.request.method, headers, body });
}

function missing(code = 'not-found'): never {
	error(code === 'not-found' ? 404 : 405, { message: refusalSentence(code), code });
}
