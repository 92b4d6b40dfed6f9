import { error, redirect } from '@sveltejs/kit';
import { requireViewer } from '$lib/server/guard';
import { failWith } from '$lib/server/refuse';
import { safeForm } from '$lib/server/safe-body';
import { archiveSession } from '$lib/server/sessions/archive';
import { openSession, workshop } from '$lib/server/sessions/queries';
import { addSession, saveSession } from '$lib/server/sessions/save';
import { withDraft } from '../editor-actions';
import type { Actions, PageServerLoad } from './$types';

const largest = 512 * 1024;

export const load: PageServerLoad = async (event) => {
	requireViewer(event, 'sessions:write');
	const { now } = event.locals;
	const number = Number(event.url.searchParams.get('revision')) || undefined;
	const [session, kit] = await Promise.all([
		openSession(Number(event.params.session), { now, number }),
		workshop({ now })
	]);
	if (!session) error(404);
	return { session, workshop: kit, shownNumber: number ?? session.number };
};

export const actions = {
	save: async (event) => {
		const viewer = requireViewer(event, 'sessions:write');
		const { now } = event.locals;
		const saved = await withDraft(await safeForm(event, largest), (draft) =>
			saveSession(viewer, Number(event.params.session), { ...draft, now })
		);
		return 'number' in saved ? { saved: saved.number } : saved;
	},
	copy: async (event) => {
		const viewer = requireViewer(event, 'sessions:write');
		const { now } = event.locals;
		const saved = await withDraft(await safeForm(event, largest), (draft) =>
			addSession(viewer, { ...draft, now })
		);
		if ('sessionId' in saved) redirect(303, `/plan/sessions/${saved.sessionId}`);
		return saved;
	},
	archive: async (event) => {
		const viewer = requireViewer(event, 'sessions:write');
		const gone = await archiveSession(viewer, Number(event.params.session), {
			now: event.locals.now
		});
		if (!gone.ok) return failWith(gone);
		redirect(303, '/plan/sessions');
	}
} satisfies Actions;
