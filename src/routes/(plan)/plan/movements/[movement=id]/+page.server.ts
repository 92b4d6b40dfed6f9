import { error, redirect } from '@sveltejs/kit';
import { refuse } from '$lib/domain/refusal';
import { movementForm } from '$lib/forms/movement';
import { readForm } from '$lib/forms/read-form';
import { requireViewer } from '$lib/server/guard';
import { groupChoices, movementPage } from '$lib/server/movements/queries';
import { archiveMovement, saveMovement } from '$lib/server/movements/save';
import { failWith } from '$lib/server/refuse';
import { safeForm } from '$lib/server/safe-body';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	requireViewer(event, 'movements:write');
	const [movement, groups] = await Promise.all([
		movementPage(Number(event.params.movement)),
		groupChoices()
	]);
	if (!movement) error(404);
	return { movement, groups };
};

export const actions = {
	save: async (event) => {
		const viewer = requireViewer(event, 'movements:write');
		const form = readForm(movementForm, await safeForm(event));
		if (!form.ok) return failWith(refuse('bad-input'), form.values, form.errors);
		const { input, basedOn } = form.data;
		const { now } = event.locals;
		const saved = await saveMovement(viewer, Number(event.params.movement), input, {
			basedOn,
			now
		});
		return saved.ok ? { saved: true } : failWith(saved, form.typed);
	},
	archive: async (event) => {
		const viewer = requireViewer(event, 'movements:write');
		const gone = await archiveMovement(viewer, Number(event.params.movement), event.locals);
		if (!gone.ok) return failWith(gone);
		redirect(303, '/plan/movements');
	}
} satisfies Actions;
