import { dayBounds, localDateOf } from '$lib/domain/calendar/zone';
import { requireViewer } from '$lib/server/guard';
import { classesOf } from '$lib/server/roll/desk';
import type { PageServerLoad } from './$types';

const aheadMs = 14 * 86_400_000;

export const load: PageServerLoad = async (event) => {
	const { personId } = requireViewer(event, 'floor:read-own');
	const { now, gym } = event.locals;
	const todayOn = localDateOf(now, gym!.zone);
	const from = dayBounds(todayOn, gym!.zone).startsAt;
	return { classes: await classesOf(personId, from, from + aheadMs), todayOn, now };
};
