import { fail, json, type ActionFailure } from '@sveltejs/kit';
import type { Refused } from '$lib/domain/refusal';
import { refusalSentence } from '$lib/wording/refusals';

/** A code's status where it is not 409, "the state of things says no". */
const statuses: Record<string, number> = {
	'bad-input': 400,
	'bad-body': 400,
	'bad-signature': 400,
	'signed-out': 401,
	'wrong-password': 401,
	'not-allowed': 403,
	'wrong-origin': 403,
	'not-found': 404,
	'no-action': 404,
	'no-method': 405,
	'body-too-large': 413,
	'wrong-body-type': 415,
	'too-many-tries': 429,
	'too-deep': 400,
	internal: 500,
	'no-gym': 503,
	'not-ready': 503
};

export const statusOf = (code: string): number => statuses[code] ?? 409;

export type Problem = {
	code: string;
	status?: number;
	detail?: Record<string, string | number>;
	/** One sentence a field. */
	errors?: Record<string, string>;
};

/** Answers an API request with an RFC 9457 document; takes a refusal or a problem of the request itself. */
export function problem(said: Refused | Problem, headers?: HeadersInit): Response {
	const { code, status, errors } =
		'refused' in said ? { code: said.refused, status: undefined, errors: undefined } : said;
	const body = {
		type: `urn:kithour:problem:${code}`,
		title: titleOf(code),
		status: status ?? statusOf(code),
		detail: refusalSentence(code, said.detail),
		code,
		...(said.detail ? { facts: said.detail } : {}),
		...(errors ? { errors } : {})
	};
	const answer = json(body, { status: body.status, headers });
	answer.headers.set('content-type', 'application/problem+json');
	return answer;
}

/** "already-booked" is "Already booked": the same for every occurrence, as RFC 9457 wants. */
const titleOf = (code: string) => code.charAt(0).toUpperCase() + code.slice(1).replaceAll('-', ' ');

/** What a refused form action hands back to its page: the code, its sentence and what was typed. */
export type Refusal<Values> = {
	refused: string;
	sentence: string;
	values: Values;
	errors: Record<string, string>;
};

/** Fails a form action with a refusal; `values` keeps what was typed. */
export function failWith<Values = Record<string, never>>(
	refusal: Refused,
	values?: Values,
	errors: Record<string, string> = {}
): ActionFailure<Refusal<Values | undefined>> {
	return fail(statusOf(refusal.refused), {
		refused: refusal.refused,
		sentence: refusalSentence(refusal.refused, refusal.detail),
		values,
		errors
	});
}
