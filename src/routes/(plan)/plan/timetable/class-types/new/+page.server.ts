import { redirect } from '@sveltejs/kit';
import { classTypeForm } from '$lib/forms/class-type';
import { addClassType } from '$lib/server/class-types/add';
import { classTypeChoices } from '$lib/server/class-types/queries';
import { requireViewer } from '$lib/server/guard';
import { planForm } from '$lib/server/plan-form';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	requireViewer(event, 'schedule:write');
	return { choices: await classTypeChoices() };
};

export const actions = {
	default: async (event) => {
		const made = await planForm(event, classTypeForm, (viewer, form) =>
			addClassType(viewer, form, event.locals)
		);
		if ('ok' in made) redirect(303, '/plan/timetable/class-types');
		return made;
	}
} satisfies Actions;
