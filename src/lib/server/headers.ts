import { subscribe, unsubscribe } from 'node:diagnostics_channel';
import type { IncomingMessage, ServerResponse } from 'node:http';

/**
 * What every answer carries, pages, files and the framework's own errors alike.
 * `same-origin`, not `no-referrer`: the latter makes browsers send `Origin: null` with our own
 * forms. Pages replace the policy for content with their own, which has nonces.
 */
export function securityHeaders(origin: string): Record<string, string> {
	return {
		'content-security-policy':
			"default-src 'none'; style-src 'self'; font-src 'self'; img-src 'self'; base-uri 'none'; form-action 'self'; frame-ancestors 'none'",
		'cross-origin-opener-policy': 'same-origin',
		'cross-origin-resource-policy': 'same-origin',
		'permissions-policy':
			'camera=(), geolocation=(), microphone=(), payment=(), usb=(), browsing-topics=()',
		'referrer-policy': 'same-origin',
		'x-content-type-options': 'nosniff',
		'x-frame-options': 'DENY',
		...(origin.startsWith('https:')
			? { 'strict-transport-security': 'max-age=63072000; includeSubDomains' }
			: {})
	};
}

/**
 * Sets them as each request reaches the process, before the framework sees it: its hooks miss
 * static files, bodies that are too large and its own refusals. Returns what ends it.
 */
export function setHeadersOnEveryAnswer(origin: string): () => void {
	const headers = Object.entries(securityHeaders(origin));
	const set = (message: unknown) => {
		const { request, response } = message as { request: IncomingMessage; response: ServerResponse };
		for (const [name, value] of headers) response.setHeader(name, value);
		hideFormTypeOfApi(request);
	};
	subscribe('http.server.request.start', set);
	return () => void unsubscribe('http.server.request.start', set);
}

/**
 * The framework refuses forms from other sites in plain text, before its hooks run. The API takes
 * no forms, and answers everything in problem documents: its own origin check meets these as well.
 */
function hideFormTypeOfApi(request: IncomingMessage): void {
	const isForm = /^(application\/x-www-form-urlencoded|multipart\/form-data|text\/plain)/i;
	if (!/^\/api(\/|\?|$)/.test(request.url ?? '')) return;
	if (isForm.test(request.headers['content-type'] ?? '')) {
		request.headers['content-type'] = 'application/octet-stream';
	}
}
