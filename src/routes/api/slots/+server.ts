import { json } from '@sveltejs/kit';
import { dayBounds } from '$lib/domain/calendar';
import { dayRange } from '$lib/forms/api';
import { readQuery } from '$lib/server/api/read';
import { writeSlot } from '$lib/server/api/write-slot';
import { slotsBetween } from '$lib/server/slots/queries';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = async ({ url, locals }) => {
	const query = readQuery(url, dayRange);
	if (!query.ok) return query.answer;
	const { zone } = locals.gym!;
	const from = dayBounds(query.data.from, zone).startsAt;
	const to = dayBounds(query.data.to, zone).endsAt;
	const slots = await slotsBetween(from, to, { personId: locals.viewer?.personId });
	return json({ slots: slots.map((slot) => writeSlot(slot, zone)) });
};
