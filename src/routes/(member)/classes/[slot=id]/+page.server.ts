import { error, redirect } from '@sveltejs/kit';
import { choicesOf, classChoices, ownBooking } from '$lib/forms/class-choices';
import { readForm } from '$lib/forms/read-form';
import { book } from '$lib/server/bookings/book';
import { cancel } from '$lib/server/bookings/cancel';
import { choose } from '$lib/server/bookings/choose';
import { requireViewer } from '$lib/server/guard';
import { failWith } from '$lib/server/refuse';
import { safeForm } from '$lib/server/safe-body';
import { classPage } from '$lib/server/slots/class-page';
import { refuse } from '$lib/domain/refusal';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ params, locals }) => {
	const { viewer, now } = locals;
	const shown = await classPage(Number(params.slot), viewer, { now });
	if (!shown) error(404);
	return { ...shown, now, mayOwnBook: viewer?.capabilities.has('bookings:write-own') ?? false };
};

export const actions = {
	book: async (event) => {
		const viewer = requireViewer(event, 'bookings:write-own');
		const form = readForm(classChoices, await safeForm(event));
		if (!form.ok) return failWith(refuse('bad-input'), form.values, form.errors);
		const { now } = event.locals;
		const booked = await book(viewer, Number(event.params.slot), { ...choicesOf(form.data), now });
		if (!booked.ok) return failWith(booked, form.typed);
		redirect(303, `/classes/${event.params.slot}`);
	},
	choose: async (event) => {
		const viewer = requireViewer(event, 'bookings:write-own');
		const body = await safeForm(event);
		const form = readForm(classChoices, body);
		const own = readForm(ownBooking, body);
		if (!form.ok || !own.ok) return failWith(refuse('bad-input'));
		const { now } = event.locals;
		const chosen = await choose(viewer, own.data.bookingId, { ...choicesOf(form.data), now });
		if (!chosen.ok) return failWith(chosen, form.typed);
		redirect(303, `/classes/${event.params.slot}`);
	},
	cancel: async (event) => {
		const viewer = requireViewer(event, 'bookings:write-own');
		const own = readForm(ownBooking, await safeForm(event));
		if (!own.ok) return failWith(refuse('bad-input'));
		const gone = await cancel(viewer, own.data.bookingId, { now: event.locals.now });
		if (!gone.ok) return failWith(gone);
		redirect(303, `/classes/${event.params.slot}?given-up=${gone.booking.status}`);
	}
} satisfies Actions;
