import { redirect } from '@sveltejs/kit';
import { localDateOf } from '$lib/domain/calendar/zone';
import { refuse } from '$lib/domain/refusal';
import { aboutMe as aboutMeForm, feedForm, feedId } from '$lib/forms/me';
import { readForm } from '$lib/forms/read-form';
import { leave } from '$lib/server/auth/leave';
import { signOutEverywhere } from '$lib/server/auth/revoke';
import { env } from '$lib/server/env';
import { createFeed, replaceFeed, revokeFeed } from '$lib/server/feeds/create';
import { feedsOf } from '$lib/server/feeds/queries';
import { requireViewer } from '$lib/server/guard';
import { passesOf, usablePasses } from '$lib/server/passes/queries';
import { aboutMe, changeAboutMe } from '$lib/server/people/about-me';
import { failWith } from '$lib/server/refuse';
import { safeForm } from '$lib/server/safe-body';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const { personId, capabilities } = requireViewer(event);
	const { now, gym } = event.locals;
	const todayOn = localDateOf(now, gym!.zone);
	const [me, passes, usable, feeds] = await Promise.all([
		aboutMe(personId),
		passesOf(personId),
		usablePasses(personId, todayOn, gym!.weekStartsOn),
		feedsOf(personId)
	]);
	const coaches = capabilities.has('floor:read-own');
	return { me, passes, usable, feeds, todayOn, coaches, plans: capabilities.has('schedule:write') };
};

const addressOf = (token: string) => `${env().origin}/feeds/${token}.ics`;

export const actions = {
	about: async (event) => {
		const viewer = requireViewer(event);
		const form = readForm(aboutMeForm, await safeForm(event));
		if (!form.ok) return failWith(refuse('bad-input'), form.values, form.errors);
		await changeAboutMe(viewer, form.data);
		return { saved: true };
	},
	addFeed: async (event) => {
		const viewer = requireViewer(event);
		const form = readForm(feedForm, await safeForm(event));
		if (!form.ok) return failWith(refuse('bad-input'), form.values, form.errors);
		const made = await createFeed(viewer, { ...form.data, now: event.locals.now });
		return made.ok ? { address: addressOf(made.token), feedId: made.feedId } : failWith(made);
	},
	replaceFeed: async (event) => {
		const viewer = requireViewer(event);
		const form = readForm(feedId, await safeForm(event));
		if (!form.ok) return failWith(refuse('bad-input'));
		const made = await replaceFeed(viewer, form.data.feedId, { now: event.locals.now });
		return made.ok ? { address: addressOf(made.token), feedId: made.feedId } : failWith(made);
	},
	revokeFeed: async (event) => {
		const viewer = requireViewer(event);
		const form = readForm(feedId, await safeForm(event));
		if (!form.ok) return failWith(refuse('bad-input'));
		const gone = await revokeFeed(viewer, form.data.feedId, { now: event.locals.now });
		return gone.ok ? { revoked: true } : failWith(gone);
	},
	everywhere: async (event) => {
		const viewer = requireViewer(event);
		await signOutEverywhere(viewer, { now: event.locals.now });
		await leave(event);
		redirect(303, '/');
	}
} satisfies Actions;
