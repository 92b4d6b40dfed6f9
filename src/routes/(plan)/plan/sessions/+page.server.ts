import { requireViewer } from '$lib/server/guard';
import { sessionCards } from '$lib/server/sessions/queries';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	requireViewer(event, 'sessions:write');
	return { sessions: await sessionCards({ now: event.locals.now }) };
};
