import { error, json } from '@sveltejs/kit';
import { writeOneSlot } from '$lib/server/api/write-slot';
import { library } from '$lib/server/kit/library';
import { revisionContents } from '$lib/server/slots/plan-slots';
import { slotById } from '$lib/server/slots/queries';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = async ({ params, locals }) => {
	const slot = await slotById(Number(params.id), { personId: locals.viewer?.personId });
	if (!slot) error(404);
	const shown = slot.session && slot.revisionId;
	const content = shown ? ((await revisionContents([shown])).get(shown) ?? null) : null;
	return json(writeOneSlot(slot, locals.gym!.zone, content, await library()));
};
