import { redirect } from '@sveltejs/kit';
import { z } from 'zod';
import { addDays, weekOf } from '$lib/domain/calendar/civil-date';
import { localDateOf } from '$lib/domain/calendar/zone';
import { requireViewer } from '$lib/server/guard';
import { planForm } from '$lib/server/plan-form';
import { publishWeek } from '$lib/server/publications/publish-week';
import { lastPublication } from '$lib/server/publications/queries';
import { weekSummary } from '$lib/server/publications/summary';
import { sessionShelf } from '$lib/server/slots/shelf';
import { weekPlan } from '$lib/server/slots/week';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	requireViewer(event, 'schedule:write');
	const { gym, now } = event.locals;
	const zone = gym?.zone ?? 'UTC';
	const weekOn = weekOf(event.params.week, gym?.weekStartsOn);
	if (weekOn !== event.params.week) redirect(303, `/plan/week/${weekOn}`);
	const todayOn = localDateOf(now, zone);
	const [days, shelf, publication] = await Promise.all([
		weekPlan(weekOn, zone),
		sessionShelf(todayOn),
		lastPublication(weekOn)
	]);
	return {
		weekOn,
		before: addDays(weekOn, -7),
		after: addDays(weekOn, 7),
		todayOn,
		now,
		days,
		shelf,
		publication,
		summary: weekSummary(days)
	};
};

export const actions = {
	publish: (event) =>
		planForm(event, z.object({}), (viewer) =>
			publishWeek(viewer, weekOf(event.params.week, event.locals.gym?.weekStartsOn), event.locals)
		)
} satisfies Actions;
