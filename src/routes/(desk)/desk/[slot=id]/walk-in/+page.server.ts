import { error, redirect } from '@sveltejs/kit';
import { requireViewer } from '$lib/server/guard';
import { findMembers } from '$lib/server/people/find';
import { usablePasses } from '$lib/server/passes/queries';
import { rollPage } from '$lib/server/roll/desk';
import { giveAction, walkInAction } from '$lib/server/roll/form-actions';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const viewer = requireViewer(event, 'bookings:write-any');
	const { gym } = event.locals;
	const shown = await rollPage(viewer, Number(event.params.slot));
	if (!shown) error(404);
	const sought = event.url.searchParams.get('name')?.slice(0, 80) ?? '';
	const found = sought.trim() ? await findMembers(sought) : [];
	const people = await Promise.all(
		found.slice(0, 8).map(async (person) => ({
			...person,
			passes: await usablePasses(person.id, shown.slot.startsOn, gym!.weekStartsOn)
		}))
	);
	return {
		slot: shown.slot,
		waiting: shown.roll.filter((r) => r.status === 'waitlisted'),
		people,
		sought
	};
};

export const actions = {
	enter: async (event) => {
		const entered = await walkInAction(event, Number(event.params.slot));
		if ('walkedIn' in entered) redirect(303, `/desk/${event.params.slot}`);
		return entered;
	},
	give: async (event) => {
		const given = await giveAction(event, Number(event.params.slot));
		if ('given' in given) redirect(303, `/desk/${event.params.slot}`);
		return given;
	}
} satisfies Actions;
