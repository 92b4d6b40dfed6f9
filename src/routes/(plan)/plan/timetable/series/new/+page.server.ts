import { redirect } from '@sveltejs/kit';
import { localDateOf } from '$lib/domain/calendar/zone';
import { seriesForm } from '$lib/forms/series';
import { requireViewer } from '$lib/server/guard';
import { planForm } from '$lib/server/plan-form';
import { safeForm } from '$lib/server/safe-body';
import { addSeries } from '$lib/server/series/add';
import { standChoices } from '$lib/server/series/choices';
import { answerDates } from '../answer-dates';
import { pickedDates, typedFields } from '../dates';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	requireViewer(event, 'schedule:write');
	const { gym, now } = event.locals;
	return { choices: await standChoices(), todayOn: localDateOf(now, gym?.zone ?? 'UTC') };
};

export const actions = {
	add: async (event) => {
		const made = await planForm(event, seriesForm, (viewer, { seen, overrideWhy, ...draft }) =>
			addSeries(viewer, draft, { seen, overrideWhy, now: event.locals.now })
		);
		if ('ok' in made) redirect(303, `/plan/timetable/series/${made.seriesId}`);
		return made;
	},
	dates: async (event) => {
		requireViewer(event, 'schedule:write');
		const form = await safeForm(event);
		return { typed: typedFields(form), answer: answerDates(pickedDates(form), event.locals) };
	}
} satisfies Actions;
