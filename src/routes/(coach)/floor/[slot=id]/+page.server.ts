import { error } from '@sveltejs/kit';
import { requireViewer } from '$lib/server/guard';
import { floorPage } from '$lib/server/roll/floor';
import { closeAction, markAction } from '$lib/server/roll/form-actions';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const viewer = requireViewer(event, 'floor:read-own');
	const page = await floorPage(viewer, Number(event.params.slot));
	if (!page) error(404);
	return { ...page, now: event.locals.now };
};

export const actions = {
	mark: (event) => markAction(event, Number(event.params.slot)),
	close: (event) => closeAction(event, Number(event.params.slot))
} satisfies Actions;
