import { addDays } from '$lib/domain/calendar/civil-date';
import { instantOf, localDateOf } from '$lib/domain/calendar/zone';
import { requireViewer } from '$lib/server/guard';
import { shortageList } from '$lib/server/slots/shortage-list';
import type { PageServerLoad } from './$types';

/** Five weeks: as far as members can see in the usual booking window, and a week more. */
const aheadDays = 35;

export const load: PageServerLoad = async (event) => {
	requireViewer(event, 'schedule:write');
	const { gym, now } = event.locals;
	const zone = gym?.zone ?? 'UTC';
	const toOn = addDays(localDateOf(now, zone), aheadDays);
	return {
		...(await shortageList({ fromAt: now, toAt: instantOf(toOn, '00:00', zone) })),
		aheadDays
	};
};
