import type { RequestEvent } from '@sveltejs/kit';
import { authCookies } from './cookie';
import { signOut } from './revoke';

/** Ends the sign-in of this browser: the row first, then the cookie. */
export async function leave(event: Pick<RequestEvent, 'locals' | 'cookies'>): Promise<void> {
	const { viewer, now } = event.locals;
	if (viewer) await signOut(viewer.signInId, now);
	const { name, options } = authCookies().sessionToken;
	event.cookies.delete(name, options);
}
