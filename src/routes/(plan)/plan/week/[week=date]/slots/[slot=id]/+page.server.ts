import { error, redirect } from '@sveltejs/kit';
import { bringBackForm, callOffForm, changeSlotForm } from '$lib/forms/slot';
import { requireViewer } from '$lib/server/guard';
import { planForm } from '$lib/server/plan-form';
import { standChoices } from '$lib/server/series/choices';
import { bringBack } from '$lib/server/slots/bring-back';
import { callOff } from '$lib/server/slots/call-off';
import { changeSlot } from '$lib/server/slots/change';
import { slotPage } from '$lib/server/slots/slot-page';
import { refusalSentence } from '$lib/wording/refusals';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	requireViewer(event, 'schedule:write');
	const [slot, choices] = await Promise.all([
		slotPage(Number(event.params.slot), event.locals),
		standChoices()
	]);
	if (!slot) error(404, { message: refusalSentence('not-found'), code: 'not-found' });
	return { ...slot, choices };
};

export const actions = {
	change: async (event) => {
		const done = await planForm(event, changeSlotForm, (viewer, form) => {
			const { sequence, why, seen, overrideWhy, ...draft } = form;
			const asked = { sequence, why, seen, overrideWhy, now: event.locals.now };
			return changeSlot(viewer, Number(event.params.slot), draft, asked);
		});
		if ('ok' in done) redirect(303, '?saved=1');
		return done;
	},
	callOff: (event) =>
		planForm(event, callOffForm, (viewer, form) =>
			callOff(viewer, Number(event.params.slot), { ...form, now: event.locals.now })
		),
	bringBack: (event) =>
		planForm(event, bringBackForm, (viewer, form) =>
			bringBack(viewer, Number(event.params.slot), { ...form, now: event.locals.now })
		)
} satisfies Actions;
