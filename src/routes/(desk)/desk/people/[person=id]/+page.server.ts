import { error } from '@sveltejs/kit';
import { localDateOf } from '$lib/domain/calendar/zone';
import { refuse, type Refused } from '$lib/domain/refusal';
import { cancelForm, correctForm, endPassForm, grantForm, memberForm } from '$lib/forms/person';
import { readForm } from '$lib/forms/read-form';
import { cancel } from '$lib/server/bookings/cancel';
import { myBookings } from '$lib/server/bookings/my-bookings';
import { requireViewer } from '$lib/server/guard';
import type { Capability } from '$lib/domain/people/capabilities';
import { correctPack } from '$lib/server/passes/correct';
import { endPass } from '$lib/server/passes/end';
import { grantPass } from '$lib/server/passes/grant';
import { passesOf, statementOf } from '$lib/server/passes/queries';
import { changeMember, memberById } from '$lib/server/people/member';
import { failWith } from '$lib/server/refuse';
import { safeForm } from '$lib/server/safe-body';
import type { z } from 'zod';
import type { Actions, PageServerLoad, RequestEvent } from './$types';

export const load: PageServerLoad = async (event) => {
	const { capabilities } = requireViewer(event, 'people:read');
	const { now, gym } = event.locals;
	const person = await memberById(Number(event.params.person));
	if (!person) error(404);
	const [passes, bookings] = await Promise.all([
		passesOf(person.id),
		myBookings(person.id, { now })
	]);
	const statements = await Promise.all(
		passes
			.filter(({ kind }) => kind === 'pack')
			.map(async ({ id }) => [id, await statementOf(id)] as const)
	);
	return {
		person,
		passes,
		statements: Object.fromEntries(statements),
		...bookings,
		todayOn: localDateOf(now, gym!.zone),
		now,
		may: {
			write: capabilities.has('people:write'),
			grant: capabilities.has('passes:grant'),
			book: capabilities.has('bookings:write-any')
		}
	};
};

type Viewer = ReturnType<typeof requireViewer>;

async function act<Data>(
	event: RequestEvent,
	capability: Capability,
	schema: z.ZodType<Data>,
	command: (viewer: Viewer, data: Data) => Promise<{ ok: true } | Refused<string>>
) {
	const viewer = requireViewer(event, capability);
	const form = readForm(schema, await safeForm(event));
	if (!form.ok) return failWith(refuse('bad-input'), form.values, form.errors);
	const done = await command(viewer, form.data);
	return done.ok ? { done: true } : failWith(done, form.typed);
}

const idOf = (event: RequestEvent) => Number(event.params.person);

export const actions = {
	change: (event) =>
		act(event, 'people:write', memberForm, (viewer, { name, email, phone }) =>
			changeMember(
				viewer,
				idOf(event),
				{ name, email: email ?? null, phone: phone || null },
				event.locals
			)
		),
	grant: (event) =>
		act(event, 'passes:grant', grantForm, (viewer, pass) =>
			grantPass(viewer, { ...pass, personId: idOf(event) }, event.locals)
		),
	correct: (event) =>
		act(event, 'passes:grant', correctForm, (viewer, { passId, credits, why }) =>
			correctPack(viewer, passId, { credits, why, now: event.locals.now })
		),
	endPass: (event) =>
		act(event, 'passes:grant', endPassForm, (viewer, { passId, why }) =>
			endPass(viewer, passId, { why, now: event.locals.now })
		),
	cancel: (event) =>
		act(event, 'bookings:write-any', cancelForm, (viewer, { bookingId, waive }) =>
			cancel(viewer, bookingId, { now: event.locals.now, waive: waive || undefined })
		)
} satisfies Actions;
