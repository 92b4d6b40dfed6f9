import { redirect } from '@sveltejs/kit';
import { addSlotForm } from '$lib/forms/slot';
import { requireViewer } from '$lib/server/guard';
import { planForm } from '$lib/server/plan-form';
import { standChoices } from '$lib/server/series/choices';
import { addSlot } from '$lib/server/slots/add';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	requireViewer(event, 'schedule:write');
	return { choices: await standChoices() };
};

export const actions = {
	default: async (event) => {
		const made = await planForm(event, addSlotForm, (viewer, { seen, overrideWhy, ...draft }) =>
			addSlot(viewer, draft, { seen, overrideWhy, now: event.locals.now })
		);
		if ('ok' in made) redirect(303, `/plan/week/${event.params.week}/slots/${made.slotId}`);
		return made;
	}
} satisfies Actions;
