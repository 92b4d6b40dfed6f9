import { redirect } from '@sveltejs/kit';
import { weekOf } from '$lib/domain/calendar/civil-date';
import { localDateOf } from '$lib/domain/calendar/zone';
import { requireViewer } from '$lib/server/guard';
import type { PageServerLoad } from './$types';

/** This week, on the gym's calendar. */
export const load: PageServerLoad = (event) => {
	requireViewer(event, 'schedule:write');
	const { gym, now } = event.locals;
	const todayOn = localDateOf(now, gym?.zone ?? 'UTC');
	redirect(303, `/plan/week/${weekOf(todayOn, gym?.weekStartsOn)}`);
};
