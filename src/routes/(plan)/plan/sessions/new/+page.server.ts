import { redirect } from '@sveltejs/kit';
import { requireViewer } from '$lib/server/guard';
import { safeForm } from '$lib/server/safe-body';
import { workshop } from '$lib/server/sessions/queries';
import { addSession } from '$lib/server/sessions/save';
import { withDraft } from '../editor-actions';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	requireViewer(event, 'sessions:write');
	return { workshop: await workshop({ now: event.locals.now }) };
};

export const actions = {
	save: async (event) => {
		const viewer = requireViewer(event, 'sessions:write');
		const { now } = event.locals;
		const saved = await withDraft(await safeForm(event, 512 * 1024), (draft) =>
			addSession(viewer, { ...draft, now })
		);
		if ('sessionId' in saved) redirect(303, `/plan/sessions/${saved.sessionId}`);
		return saved;
	}
} satisfies Actions;
