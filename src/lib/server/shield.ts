import type { RequestEvent } from '@sveltejs/kit';
import { actionName } from './authz';

const safeMethods = ['GET', 'HEAD', 'OPTIONS'];
const methods = [...safeMethods, 'POST', 'PUT', 'PATCH', 'DELETE'];

/** Signed by the payment service itself; nothing else may come from another site. */
const foreign = ['/api/stripe/webhook'];

/** The code with which a request is refused before anything of it is read; null lets it through. */
export function refusedUnread(
	event: Pick<RequestEvent, 'request' | 'url'>,
	origin: string
): string | null {
	const { request, url } = event;
	if (!methods.includes(request.method)) return 'no-method';
	if (hasOddAction(url)) return 'no-action';
	if (safeMethods.includes(request.method) || foreign.includes(url.pathname)) return null;
	return request.headers.get('origin') === origin ? null : 'wrong-origin';
}

/** Names that every object has, and the framework's reserved one, crash its look-up of actions. */
function hasOddAction(url: URL): boolean {
	const name = actionName(url);
	return name !== null && (name in Object.prototype || name === 'default');
}
