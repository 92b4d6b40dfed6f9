import type { RequestEvent } from '@sveltejs/kit';
import { refuse } from '$lib/domain/refusal';
import { readForm } from '$lib/forms/read-form';
import { giveForm, markForm, walkInForm } from '$lib/forms/roll';
import { giveToWaiting } from '../bookings/give';
import { walkIn } from '../bookings/walk-in';
import { requireViewer } from '../guard';
import { failWith } from '../refuse';
import { safeForm } from '../safe-body';
import { closeRoll } from './close';
import { markRoll } from './mark';

/** The roll's form actions, the same at the desk and for a coach. */
type Asked = Pick<RequestEvent, 'request' | 'locals' | 'url' | 'route'>;
const takers = ['roll:take', 'floor:read-own'] as const;

export async function markAction(event: Asked, slotId: number) {
	const viewer = requireViewer(event, takers);
	const form = readForm(markForm, await safeForm(event));
	if (!form.ok) return failWith(refuse('bad-input'));
	const marked = await markRoll(viewer, slotId, [form.data], { now: event.locals.now });
	return marked.ok ? { marked: form.data.bookingId } : failWith(marked);
}

export async function closeAction(event: Asked, slotId: number) {
	const viewer = requireViewer(event, takers);
	const closed = await closeRoll(viewer, slotId, { now: event.locals.now });
	return closed.ok ? { closed: closed.noShows } : failWith(closed);
}

export async function giveAction(event: Asked, slotId: number) {
	const viewer = requireViewer(event, 'bookings:write-any');
	const form = readForm(giveForm, await safeForm(event));
	if (!form.ok) return failWith(refuse('bad-input'));
	const given = await giveToWaiting(viewer, slotId, { ...form.data, now: event.locals.now });
	return given.ok ? { given: given.name } : failWith(given);
}

export async function walkInAction(event: Asked, slotId: number) {
	const viewer = requireViewer(event, 'bookings:write-any');
	const form = readForm(walkInForm, await safeForm(event));
	if (!form.ok) return failWith(refuse('bad-input'), form.values, form.errors);
	const { personId, passOver, complimentary } = form.data;
	const entered = await walkIn(viewer, slotId, {
		personId,
		passOver: passOver || undefined,
		complimentary: complimentary || undefined,
		now: event.locals.now
	});
	return entered.ok ? { walkedIn: entered.bookingId } : failWith(entered, form.typed);
}
