import { closureForm, endClosureForm } from '$lib/forms/closure';
import { localDateOf } from '$lib/domain/calendar/zone';
import { close } from '$lib/server/closures/close';
import { endClosure } from '$lib/server/closures/end';
import { listClosures } from '$lib/server/closures/queries';
import { requireViewer } from '$lib/server/guard';
import { planForm } from '$lib/server/plan-form';
import { standChoices } from '$lib/server/series/choices';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	requireViewer(event, 'schedule:write');
	const todayOn = localDateOf(event.locals.now, event.locals.gym?.zone ?? 'UTC');
	const [closures, { rooms }] = await Promise.all([listClosures(todayOn), standChoices()]);
	return { closures, rooms, todayOn };
};

export const actions = {
	close: (event) =>
		planForm(event, closureForm, (viewer, { seen, ...draft }) =>
			close(viewer, draft, { seen, now: event.locals.now })
		),
	end: (event) =>
		planForm(event, endClosureForm, (viewer, { closureId }) =>
			endClosure(viewer, closureId, event.locals)
		)
} satisfies Actions;
