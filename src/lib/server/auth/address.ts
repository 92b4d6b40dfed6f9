import type { RequestEvent } from '@sveltejs/kit';

/** Where the request came from: the socket, or the proxy header that ADDRESS_HEADER names. */
export function clientAddress(event: Pick<RequestEvent, 'getClientAddress'>): string {
	try {
		return event.getClientAddress();
	} catch {
		return 'unknown';
	}
}
