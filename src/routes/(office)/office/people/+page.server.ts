import type { RequestEvent } from '@sveltejs/kit';
import type { z } from 'zod';
import type { Refused } from '$lib/domain/refusal';
import { readForm } from '$lib/forms/read-form';
import { inviteForm, personForm, roleForm } from '$lib/forms/staff';
import { requireViewer, type Viewer } from '$lib/server/guard';
import { invite } from '$lib/server/people/invite';
import { grantRole, revokeRole } from '$lib/server/people/roles';
import { reopenAccount, shutAccount } from '$lib/server/people/shut';
import { listStaff } from '$lib/server/people/staff';
import { failWith } from '$lib/server/refuse';
import { safeForm } from '$lib/server/safe-body';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	requireViewer(event, 'staff:write');
	return { staff: await listStaff() };
};

export const actions = {
	invite: (event) =>
		run(event, inviteForm, 'invited', (viewer, form) => invite(viewer, form, event.locals)),
	grant: (event) =>
		run(event, roleForm, 'granted', (viewer, form) => grantRole(viewer, form, event.locals)),
	revoke: (event) =>
		run(event, roleForm, 'revoked', (viewer, form) => revokeRole(viewer, form, event.locals)),
	shut: (event) =>
		run(event, personForm, 'shut', (viewer, form) =>
			shutAccount(viewer, form.personId, event.locals)
		),
	reopen: (event) =>
		run(event, personForm, 'reopened', (viewer, form) =>
			reopenAccount(viewer, form.personId, event.locals)
		)
} satisfies Actions;

/** What the five have in common: guard, read, one command, answer. */
async function run<Form>(
	event: RequestEvent,
	schema: z.ZodType<Form>,
	done: 'invited' | 'granted' | 'revoked' | 'shut' | 'reopened',
	command: (viewer: Viewer, form: Form) => Promise<{ ok: true } | Refused>
) {
	const viewer = requireViewer(event, 'staff:write');
	const read = readForm(schema, await safeForm(event));
	if (!read.ok) return failWith({ ok: false, refused: 'bad-input' }, read.values, read.errors);
	const answer = await command(viewer, read.data);
	return answer.ok ? { done } : failWith(answer, read.typed);
}
