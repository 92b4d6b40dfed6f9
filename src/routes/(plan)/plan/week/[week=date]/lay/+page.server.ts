import { error, redirect } from '@sveltejs/kit';
import { layForm } from '$lib/forms/lay';
import { readForm } from '$lib/forms/read-form';
import { requireViewer } from '$lib/server/guard';
import { planForm } from '$lib/server/plan-form';
import { lay } from '$lib/server/slots/lay';
import { layingPage } from '$lib/server/slots/laying-page';
import { refusalSentence } from '$lib/wording/refusals';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	requireViewer(event, 'schedule:write');
	const asked = new FormData();
	for (const [name, value] of event.url.searchParams) asked.append(name, value);
	const read = readForm(layForm, asked);
	if (!read.ok) return { laying: null, refused: Object.values(read.errors)[0] ?? null };
	const laying = await layingPage(read.data, event.locals);
	if (laying.ok) return { laying, refused: null };
	if (laying.refused === 'not-found') {
		error(404, { message: refusalSentence('not-found'), code: 'not-found' });
	}
	return { laying: null, refused: refusalSentence(laying.refused, laying.detail) };
};

export const actions = {
	default: async (event) => {
		const done = await planForm(event, layForm, (viewer, form) => lay(viewer, form, event.locals));
		if ('ok' in done) redirect(303, `/plan/week/${event.params.week}?laid=${done.slots}`);
		return done;
	}
} satisfies Actions;
