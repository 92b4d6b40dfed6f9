import { dayBounds, localDateOf } from '$lib/domain/calendar/zone';
import { slotsBetween } from '$lib/server/slots/queries';
import type { PageServerLoad } from './$types';

const dayMs = 86_400_000;

/** The front page shows the next class whose session is out. */
export const load: PageServerLoad = async ({ locals }) => {
	const { now, gym } = locals;
	const from = dayBounds(localDateOf(now, gym!.zone), gym!.zone).startsAt;
	const slots = await slotsBetween(from, from + 2 * dayMs);
	const coming = slots.filter((slot) => slot.startsAt > now && slot.cancelledAt === null);
	return { next: coming.find(({ session }) => session) ?? coming[0] ?? null };
};
