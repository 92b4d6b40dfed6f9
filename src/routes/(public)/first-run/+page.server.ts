import { redirect } from '@sveltejs/kit';
import { firstRunForm } from '$lib/forms/first-run';
import { readForm } from '$lib/forms/read-form';
import { signInByPassword } from '$lib/server/auth/sign-in';
import { setUpGym } from '$lib/server/gym/set-up';
import { failWith } from '$lib/server/refuse';
import { safeForm } from '$lib/server/safe-body';
import { gymChoices } from '$lib/wording/gym-choices';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = ({ locals }) => {
	if (locals.gym) redirect(303, '/');
	return { choices: gymChoices() };
};

export const actions = {
	default: async (event) => {
		const read = readForm(firstRunForm, await safeForm(event));
		if (!read.ok) return failWith({ ok: false, refused: 'bad-input' }, read.values, read.errors);
		const form = await setUpGym(read.data, event.locals);
		if (!form.ok) return failWith(form, read.typed);
		await signInByPassword(event, read.data.owner);
		redirect(303, '/office/settings');
	}
} satisfies Actions;
