import {
	error,
	redirect,
	type Handle,
	type HandleServerError,
	type ServerInit
} from '@sveltejs/kit';
import { sequence } from '@sveltejs/kit/hooks';
import { building } from '$app/environment';
import { answerAuth } from '$lib/server/auth/handle';
import { signInCookie } from '$lib/server/auth/cookie';
import { loadViewer } from '$lib/server/auth/viewer';
import { boot } from '$lib/server/boot';
import { now } from '$lib/server/clock';
import { env } from '$lib/server/env';
import { isApi } from '$lib/server/guard';
import { refusedByRule } from '$lib/server/guard-route';
import { currentGym } from '$lib/server/gym/queries';
import { log } from '$lib/server/log';
import { asProblem } from '$lib/server/problems';
import { problem, statusOf } from '$lib/server/refuse';
import { discardBody } from '$lib/server/safe-body';
import { refusedUnread } from '$lib/server/shield';
import { refusalSentence } from '$lib/wording/refusals';

export const init: ServerInit = async () => {
	if (!building) await boot();
};

/** Names the request, keeps private answers out of caches, and makes API errors problem documents. */
const frame: Handle = async ({ event, resolve }) => {
	event.locals.requestId = crypto.randomUUID();
	event.locals.now = now();
	event.locals.viewer = null;
	event.locals.gym = null;
	const answer = await asProblem(event, () =>
		resolve(event, { transformPageChunk: ({ html }) => fillPage(html, event.locals.theme) })
	).finally(() => discardBody(event));
	answer.headers.set('x-request-id', event.locals.requestId);
	if (event.locals.viewer && !answer.headers.has('cache-control')) {
		answer.headers.set('cache-control', 'private, no-store');
	}
	return answer;
};

/** The language and the person's own theme, before anything is painted. */
const fillPage = (html: string, theme: 'light' | 'dark' | null) =>
	html.replace('lang="%lang%"', `lang="en"${theme ? ` data-theme="${theme}"` : ''}`);

const shield: Handle = ({ event, resolve }) => {
	const refused = refusedUnread(event, env().origin);
	return refused ? refuse(event, refused) : resolve(event);
};

/** Loads who asks and at which gym, anew each time: a revoked sign-in ends with its next request. */
const identify: Handle = async ({ event, resolve }) => {
	const [loaded, gym] = await Promise.all([
		loadViewer(event.cookies.get(signInCookie()), event.locals.now),
		currentGym()
	]);
	event.locals.viewer = loaded?.viewer ?? null;
	event.locals.theme = loaded?.theme ?? null;
	event.locals.gym = gym;
	return resolve(event);
};

/** Until there is a gym there is one page, and the API says so. */
const firstRun: Handle = ({ event, resolve }) => {
	const open = ['/first-run', '/api/health'].includes(event.url.pathname);
	if (event.locals.gym || open) return resolve(event);
	if (isApi(event)) return problem({ code: 'no-gym' });
	if (event.route.id === null) return resolve(event);
	redirect(303, '/first-run');
};

const guard: Handle = ({ event, resolve }) => {
	const refused = refusedByRule(event);
	return refused ? refuse(event, refused) : resolve(event);
};

export const handle = sequence(frame, shield, identify, firstRun, answerAuth, guard);

function refuse(event: Parameters<Handle>[0]['event'], code: string): Response {
	if (isApi(event)) return problem({ code });
	error(statusOf(code), { message: refusalSentence(code), code });
}

export const handleError: HandleServerError = ({ error: cause, event, status }) => {
	const errorId = event.locals.requestId ?? crypto.randomUUID();
	if (status >= 500) {
		log.error(
			{ err: cause, errorId, route: event.route.id, method: event.request.method },
			'fault'
		);
	}
	const code = {
		400: 'bad-body',
		404: 'not-found',
		405: 'no-method',
		413: 'body-too-large',
		415: 'wrong-body-type'
	}[status];
	return { message: refusalSentence(code ?? 'internal'), code: code ?? 'internal', errorId };
};
