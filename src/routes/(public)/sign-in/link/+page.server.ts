import { redirect } from '@sveltejs/kit';
import { homeOf } from '$lib/domain/people/home';
import { followForm } from '$lib/forms/sign-in';
import { readForm } from '$lib/forms/read-form';
import { returnPath } from '$lib/server/auth/return-path';
import { signInByLink } from '$lib/server/auth/sign-in';
import { rolesOfAccount } from '$lib/server/people/roles-of';
import { failWith } from '$lib/server/refuse';
import { safeForm } from '$lib/server/safe-body';
import type { Actions, PageServerLoad } from './$types';

/** Reading the page does not spend the link: programs that look into mail open it too. */
export const load: PageServerLoad = ({ url }) => ({
	email: url.searchParams.get('email') ?? '',
	token: url.searchParams.get('token') ?? ''
});

export const actions = {
	default: async (event) => {
		const read = readForm(followForm, await safeForm(event));
		if (!read.ok) return failWith({ ok: false, refused: 'link-spent' });
		const entered = await signInByLink(event, read.data);
		if (!entered.ok) return failWith(entered);
		const home = homeOf(await rolesOfAccount(read.data.email));
		redirect(303, returnPath(event.url.searchParams.get('to'), home));
	}
} satisfies Actions;
