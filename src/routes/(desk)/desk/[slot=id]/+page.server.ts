import { error } from '@sveltejs/kit';
import { requireViewer } from '$lib/server/guard';
import { classesOn, rollPage } from '$lib/server/roll/desk';
import { closeAction, giveAction, markAction } from '$lib/server/roll/form-actions';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const viewer = requireViewer(event, 'roll:take');
	const { now, gym } = event.locals;
	const shown = await rollPage(viewer, Number(event.params.slot));
	if (!shown) error(404);
	return { ...shown, classes: await classesOn(shown.slot.startsOn, gym!.zone), now };
};

export const actions = {
	mark: (event) => markAction(event, Number(event.params.slot)),
	close: (event) => closeAction(event, Number(event.params.slot)),
	give: (event) => giveAction(event, Number(event.params.slot))
} satisfies Actions;
