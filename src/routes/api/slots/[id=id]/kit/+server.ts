import { error, json } from '@sveltejs/kit';
import { writeKit } from '$lib/server/api/write-kit';
import { requireViewer } from '$lib/server/guard';
import { kitOfSlot } from '$lib/server/slots/kit-of';
import { limitsOfSlots } from '$lib/server/slots/limits';
import { slotById } from '$lib/server/slots/queries';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = async (event) => {
	const { capabilities } = requireViewer(event);
	const slot = await slotById(Number(event.params.id));
	if (!slot) error(404);
	const { limit, limitedBy } = slot.places;
	if (!capabilities.has('schedule:read-all')) return json({ limit, limitedBy });
	const limits = (await limitsOfSlots([slot.id])).get(slot.id);
	const kit = limits && (await kitOfSlot(slot, limits));
	return json(kit ? writeKit(kit, event.locals.gym!.zone) : { limit, limitedBy });
};
