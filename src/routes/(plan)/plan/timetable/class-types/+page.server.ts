import { bringBackClassType, archiveClassType } from '$lib/server/class-types/archive';
import { listClassTypes } from '$lib/server/class-types/queries';
import { whichClassTypeForm } from '$lib/forms/class-type';
import { requireViewer } from '$lib/server/guard';
import { planForm } from '$lib/server/plan-form';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	requireViewer(event, 'schedule:write');
	return { classTypes: await listClassTypes(event.locals.now) };
};

export const actions = {
	archive: (event) =>
		planForm(event, whichClassTypeForm, (viewer, { classTypeId }) =>
			archiveClassType(viewer, classTypeId, event.locals)
		),
	bringBack: (event) =>
		planForm(event, whichClassTypeForm, (viewer, { classTypeId }) =>
			bringBackClassType(viewer, classTypeId, event.locals)
		)
} satisfies Actions;
