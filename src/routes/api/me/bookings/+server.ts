import { json } from '@sveltejs/kit';
import { dayBounds } from '$lib/domain/calendar';
import { dayRange } from '$lib/forms/api';
import { readQuery } from '$lib/server/api/read';
import { writeMine, writeSlot } from '$lib/server/api/write-slot';
import { bookingsOf } from '$lib/server/bookings/queries';
import { requireViewer } from '$lib/server/guard';
import { slotsBetween } from '$lib/server/slots/queries';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = async (event) => {
	const { personId } = requireViewer(event, 'bookings:write-own');
	const query = readQuery(event.url, dayRange);
	if (!query.ok) return query.answer;
	const { zone } = event.locals.gym!;
	const from = dayBounds(query.data.from, zone).startsAt;
	const to = dayBounds(query.data.to, zone).endsAt;
	const [own, slots] = await Promise.all([
		bookingsOf(personId, from, to),
		slotsBetween(from, to, { personId })
	]);
	const byId = new Map(slots.map((slot) => [slot.id, slot]));
	return json({
		bookings: own.map((booking) => ({
			...writeMine(booking),
			slot: writeSlot(byId.get(booking.slotId)!, zone)
		}))
	});
};
