import { redirect } from '@sveltejs/kit';
import { refuse } from '$lib/domain/refusal';
import { movementForm } from '$lib/forms/movement';
import { readForm } from '$lib/forms/read-form';
import { requireViewer } from '$lib/server/guard';
import { groupChoices } from '$lib/server/movements/queries';
import { addMovement } from '$lib/server/movements/save';
import { failWith } from '$lib/server/refuse';
import { safeForm } from '$lib/server/safe-body';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	requireViewer(event, 'movements:write');
	return { groups: await groupChoices() };
};

export const actions = {
	save: async (event) => {
		const viewer = requireViewer(event, 'movements:write');
		const form = readForm(movementForm, await safeForm(event));
		if (!form.ok) return failWith(refuse('bad-input'), form.values, form.errors);
		const added = await addMovement(viewer, form.data.input, event.locals);
		if (!added.ok) return failWith(added, form.typed);
		redirect(303, `/plan/movements/${added.id}`);
	}
} satisfies Actions;
