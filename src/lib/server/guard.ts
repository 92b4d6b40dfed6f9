import { error, redirect, type RequestEvent } from '@sveltejs/kit';
import type { Capability, Role } from '$lib/domain/people/capabilities';
import * as m from '$lib/wording/compiled/messages';
import { allows } from './authz';

/** Whoever asks, as loaded for this request. `signInId` is the row of their device. */
export type Viewer = {
	personId: number;
	name: string;
	email: string | null;
	roles: Role[];
	capabilities: ReadonlySet<Capability>;
	signInId: string;
};

type Asked = Pick<RequestEvent, 'locals' | 'url' | 'route'>;

/**
 * Opens every load, action and endpoint that is not open to anyone. Of a list of
 * capabilities any one will do. Nobody signed in: a page goes to the sign-in page and comes
 * back, the API answers 401. A missing capability is 403.
 */
export function requireViewer(
	event: Asked,
	capability?: Capability | readonly Capability[]
): Viewer {
	const { viewer } = event.locals;
	if (!viewer) {
		if (isApi(event)) error(401, { message: m.refused_signed_out(), code: 'signed-out' });
		redirect(303, signInAddress(event.url));
	}
	if (!allows(capability ?? 'signed-in', viewer)) {
		error(403, { message: m.refused_not_allowed(), code: 'not-allowed' });
	}
	return viewer;
}

export const isApi = (event: Pick<RequestEvent, 'url'>): boolean =>
	event.url.pathname === '/api' || event.url.pathname.startsWith('/api/');

export const signInAddress = (from: URL): string =>
	`/sign-in?to=${encodeURIComponent(from.pathname + from.search)}`;
