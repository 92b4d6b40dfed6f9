import { instantOf } from '$lib/domain/calendar/zone';
import { refuse, type Refused } from '$lib/domain/refusal';
import { changeItemForm, groupForm, itemForm, rowForm, spellForm } from '$lib/forms/kit';
import { readForm } from '$lib/forms/read-form';
import { requireViewer } from '$lib/server/guard';
import { addGroup, archiveGroup } from '$lib/server/kit/change-groups';
import { addItem, addSpell, archiveItem, changeItem, endSpell } from '$lib/server/kit/change-items';
import { kitGroupsWithItems } from '$lib/server/kit/queries';
import { failWith } from '$lib/server/refuse';
import { listRooms } from '$lib/server/rooms/queries';
import { safeForm } from '$lib/server/safe-body';
import type { z } from 'zod';
import type { Actions, PageServerLoad, RequestEvent } from './$types';

export const load: PageServerLoad = async (event) => {
	requireViewer(event, 'kit:write');
	const { now } = event.locals;
	const [groups, rooms] = await Promise.all([kitGroupsWithItems({ now }), listRooms(now)]);
	return { groups, rooms, now };
};

type Viewer = ReturnType<typeof requireViewer>;

/** Reads a form, asks one command, answers. */
async function act<Data>(
	event: RequestEvent,
	schema: z.ZodType<Data>,
	command: (viewer: Viewer, data: Data) => Promise<{ ok: true } | Refused<string>>
) {
	const viewer = requireViewer(event, 'kit:write');
	const form = readForm(schema, await safeForm(event));
	if (!form.ok) return failWith(refuse('bad-input'), form.values, form.errors);
	const done = await command(viewer, form.data);
	return done.ok ? { done: true } : failWith(done, form.typed);
}

export const actions = {
	addGroup: (event) =>
		act(event, groupForm, (viewer, group) => addGroup(viewer, group, event.locals)),
	archiveGroup: (event) =>
		act(event, rowForm, (viewer, { id }) => archiveGroup(viewer, id, event.locals)),
	addItem: (event) =>
		act(event, itemForm, (viewer, { loadKg, roomId, note, ...item }) =>
			addItem(
				viewer,
				{ ...item, loadKg: loadKg ?? null, roomId: roomId ?? null, note: note || null },
				event.locals
			)
		),
	changeItem: (event) =>
		act(event, changeItemForm, (viewer, { id, roomId, note, count }) =>
			changeItem(viewer, id, { count, roomId: roomId ?? null, note: note || null }, event.locals)
		),
	archiveItem: (event) =>
		act(event, rowForm, (viewer, { id }) => archiveItem(viewer, id, event.locals)),
	addSpell: (event) =>
		act(event, spellForm, (viewer, { from, to, ...spell }) => {
			const at = (local: string) =>
				instantOf(local.slice(0, 10), local.slice(11), event.locals.gym!.zone);
			const times = { fromAt: at(from), toAt: to === undefined ? null : at(to) };
			return addSpell(viewer, { ...spell, ...times }, event.locals);
		}),
	endSpell: (event) => act(event, rowForm, (viewer, { id }) => endSpell(viewer, id, event.locals))
} satisfies Actions;
