import { error } from '@sveltejs/kit';
import { classTypeForm } from '$lib/forms/class-type';
import { editClassType } from '$lib/server/class-types/edit';
import { classTypeChoices, findClassType } from '$lib/server/class-types/queries';
import { requireViewer } from '$lib/server/guard';
import { planForm } from '$lib/server/plan-form';
import { refusalSentence } from '$lib/wording/refusals';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	requireViewer(event, 'schedule:write');
	const [classType, choices] = await Promise.all([
		findClassType(Number(event.params.type)),
		classTypeChoices()
	]);
	if (!classType) error(404, { message: refusalSentence('not-found'), code: 'not-found' });
	return { classType, choices };
};

export const actions = {
	default: (event) =>
		planForm(event, classTypeForm, (viewer, form) =>
			editClassType(viewer, Number(event.params.type), form, event.locals)
		)
} satisfies Actions;
