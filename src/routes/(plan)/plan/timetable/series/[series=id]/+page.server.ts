import { error, redirect } from '@sveltejs/kit';
import { localDateOf } from '$lib/domain/calendar/zone';
import { editSeriesForm, endSeriesForm } from '$lib/forms/series';
import { requireViewer } from '$lib/server/guard';
import { planForm } from '$lib/server/plan-form';
import { safeForm } from '$lib/server/safe-body';
import { standChoices } from '$lib/server/series/choices';
import { editSeries } from '$lib/server/series/edit';
import { endSeries } from '$lib/server/series/end';
import { seriesPage } from '$lib/server/series/page';
import { refusalSentence } from '$lib/wording/refusals';
import { answerDates } from '../answer-dates';
import { pickedDates, typedFields } from '../dates';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	requireViewer(event, 'schedule:write');
	const { gym, now } = event.locals;
	const page = gym && (await seriesPage(Number(event.params.series), { gym, now }));
	if (!page) error(404, { message: refusalSentence('not-found'), code: 'not-found' });
	return {
		...page,
		choices: await standChoices(),
		todayOn: localDateOf(now, gym.zone),
		answer: answerDates(page.picked, event.locals)
	};
};

export const actions = {
	edit: async (event) => {
		const done = await planForm(event, editSeriesForm, (viewer, form) => {
			const { scope, version, includeChanged, seen, overrideWhy, ...draft } = form;
			const asked = { scope, version, includeChanged, seen, overrideWhy, now: event.locals.now };
			return editSeries(viewer, Number(event.params.series), draft, asked);
		});
		if ('ok' in done) redirect(303, `/plan/timetable/series/${done.seriesId}?saved=1`);
		return done;
	},
	end: async (event) => {
		const done = await planForm(event, endSeriesForm, (viewer, form) =>
			endSeries(viewer, Number(event.params.series), { ...form, now: event.locals.now })
		);
		if ('ok' in done) redirect(303, '/plan/timetable');
		return done;
	},
	dates: async (event) => {
		requireViewer(event, 'schedule:write');
		const form = await safeForm(event);
		return { typed: typedFields(form), answer: answerDates(pickedDates(form), event.locals) };
	}
} satisfies Actions;
