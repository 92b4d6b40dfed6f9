import { redirect } from '@sveltejs/kit';
import { homeOf } from '$lib/domain/people/home';
import { linkForm, passwordForm } from '$lib/forms/sign-in';
import { readForm } from '$lib/forms/read-form';
import { returnPath } from '$lib/server/auth/return-path';
import { askForLink, signInByPassword } from '$lib/server/auth/sign-in';
import { demoSignIns, inboxAddress } from '$lib/server/fakes';
import { rolesOfAccount } from '$lib/server/people/roles-of';
import { failWith } from '$lib/server/refuse';
import { safeForm } from '$lib/server/safe-body';
import { refusalSentence } from '$lib/wording/refusals';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = ({ locals, url }) => {
	const to = returnPath(url.searchParams.get('to'), '');
	if (locals.viewer) redirect(303, to || homeOf(locals.viewer.roles));
	const refused = url.searchParams.get('code') ?? url.searchParams.get('error');
	return {
		to,
		withPassword: url.searchParams.get('with') === 'password',
		sent: url.searchParams.has('sent'),
		refused: refused && refusalSentence(known(refused)),
		demo: demoSignIns(),
		inbox: inboxAddress()
	};
};

export const actions = {
	link: async (event) => {
		const read = readForm(linkForm, await safeForm(event));
		if (!read.ok) return failWith({ ok: false, refused: 'bad-input' }, read.values, read.errors);
		const to = returnPath(event.url.searchParams.get('to'), '/');
		const asked = await askForLink(event, read.data.email, to);
		if (!asked.ok) return failWith(asked, read.data);
		return { sentTo: read.data.email };
	},

	password: async (event) => {
		const read = readForm(passwordForm, await safeForm(event));
		if (!read.ok) return failWith({ ok: false, refused: 'bad-input' }, read.values, read.errors);
		const { email } = read.data;
		const entered = await signInByPassword(event, read.data);
		if (!entered.ok) return failWith(entered, { email });
		const home = homeOf(await rolesOfAccount(email));
		redirect(303, returnPath(event.url.searchParams.get('to'), home));
	}
} satisfies Actions;

/** Auth.js sends people back here with codes of its own. */
function known(code: string): string {
	if (code === 'Verification') return 'link-spent';
	return ['too-many-tries', 'wrong-password'].includes(code) ? code : 'signed-out';
}
