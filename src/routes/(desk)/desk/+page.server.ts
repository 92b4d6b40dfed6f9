import { isCivilDate } from '$lib/domain/calendar/civil-date';
import { localDateOf } from '$lib/domain/calendar/zone';
import { requireViewer } from '$lib/server/guard';
import { classesOn, currentOf, rollPage } from '$lib/server/roll/desk';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const viewer = requireViewer(event, 'roll:take');
	const { now, gym } = event.locals;
	const asked = event.url.searchParams.get('day') ?? '';
	const dayOn = isCivilDate(asked) ? asked : localDateOf(now, gym!.zone);
	const classes = await classesOn(dayOn, gym!.zone);
	const current = currentOf(classes, now);
	const shown = current && (await rollPage(viewer, current.id));
	return { classes, dayOn, now, shown };
};
