import { redirect } from '@sveltejs/kit';
import { homeOf } from '$lib/domain/people/home';
import { readForm } from '$lib/forms/read-form';
import { signUpForm } from '$lib/forms/sign-up';
import { clientAddress } from '$lib/server/auth/address';
import { maySignUp } from '$lib/server/auth/limits';
import { returnPath } from '$lib/server/auth/return-path';
import { askForLink, signInByPassword } from '$lib/server/auth/sign-in';
import { inboxAddress } from '$lib/server/fakes';
import { signUp } from '$lib/server/people/sign-up';
import { failWith } from '$lib/server/refuse';
import { safeForm } from '$lib/server/safe-body';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = ({ locals }) => {
	if (locals.viewer) redirect(303, homeOf(locals.viewer.roles));
	return { inbox: inboxAddress() };
};

export const actions = {
	default: async (event) => {
		const { gym, now } = event.locals;
		const read = readForm(signUpForm, await safeForm(event));
		if (!read.ok) return failWith({ ok: false, refused: 'bad-input' }, read.values, read.errors);
		const { name, email, password } = read.data;
		if (!gym) return failWith({ ok: false, refused: 'no-gym' }, { name, email });
		if (!(await maySignUp(clientAddress(event)))) {
			return failWith({ ok: false, refused: 'too-many-tries' }, { name, email });
		}
		const made = await signUp(read.data, { gym, now });
		if (!made.ok) return failWith(made, { name, email });

		const to = returnPath(event.url.searchParams.get('to'), homeOf(['member']));
		if (!password) {
			await askForLink(event, email, to);
			return { sentTo: email };
		}
		const entered = await signInByPassword(event, { email, password });
		redirect(303, entered.ok ? to : '/sign-in');
	}
} satisfies Actions;
