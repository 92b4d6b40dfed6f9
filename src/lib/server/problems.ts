import { isHttpError, type RequestEvent } from '@sveltejs/kit';
import { isApi } from './guard';
import { problem } from './refuse';

const codes: Record<number, string> = {
	400: 'bad-body',
	401: 'signed-out',
	403: 'not-allowed',
	404: 'not-found',
	405: 'no-method',
	413: 'body-too-large',
	415: 'wrong-body-type',
	429: 'too-many-tries'
};

/**
 * Turns every error of an API address into a problem document, whoever made it: an endpoint's
 * `error()`, a fault, the framework's own 404 and 405. Other addresses pass through.
 */
export async function asProblem(
	event: Pick<RequestEvent, 'url'>,
	answering: () => Promise<Response> | Response
): Promise<Response> {
	const answer = await thrownToo(event, answering);
	const type = answer.headers.get('content-type') ?? '';
	if (!isApi(event) || answer.status < 400 || type.startsWith('application/problem+json')) {
		return new Response(answer.body, answer);
	}
	const said: unknown = type.startsWith('application/json')
		? await answer.json().catch(() => null)
		: null;
	const headers = new Headers();
	const allow = answer.headers.get('allow');
	if (allow) headers.set('allow', allow);
	return problem(
		{ code: codeIn(said) ?? codes[answer.status] ?? 'internal', status: answer.status },
		headers
	);
}

async function thrownToo(
	event: Pick<RequestEvent, 'url'>,
	answering: () => Promise<Response> | Response
): Promise<Response> {
	try {
		return await answering();
	} catch (thrown) {
		if (!isApi(event) || !isHttpError(thrown)) throw thrown;
		return problem({
			code: thrown.body.code ?? codes[thrown.status] ?? 'internal',
			status: thrown.status
		});
	}
}

function codeIn(body: unknown): string | null {
	if (body === null || typeof body !== 'object' || !('code' in body)) return null;
	return typeof body.code === 'string' ? body.code : null;
}
