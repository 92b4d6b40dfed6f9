import { redirect } from '@sveltejs/kit';
import { refuse } from '$lib/domain/refusal';
import { memberForm } from '$lib/forms/person';
import { readForm } from '$lib/forms/read-form';
import { requireViewer } from '$lib/server/guard';
import { findMembers } from '$lib/server/people/find';
import { addMember } from '$lib/server/people/member';
import { failWith } from '$lib/server/refuse';
import { safeForm } from '$lib/server/safe-body';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const { capabilities } = requireViewer(event, 'people:read');
	const sought = event.url.searchParams.get('name')?.slice(0, 80) ?? '';
	return { sought, people: await findMembers(sought), mayAdd: capabilities.has('people:write') };
};

export const actions = {
	add: async (event) => {
		const viewer = requireViewer(event, 'people:write');
		const form = readForm(memberForm, await safeForm(event));
		if (!form.ok) return failWith(refuse('bad-input'), form.values, form.errors);
		const { name, email, phone } = form.data;
		const input = { name, email: email ?? null, phone: phone || null };
		const added = await addMember(viewer, input, event.locals);
		if (!added.ok) return failWith(added, form.typed);
		redirect(303, `/desk/people/${added.id}`);
	}
} satisfies Actions;
