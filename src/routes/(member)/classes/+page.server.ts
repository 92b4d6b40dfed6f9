import { localDateOf } from '$lib/domain/calendar/zone';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = ({ locals }) => ({
	now: locals.now,
	todayOn: localDateOf(locals.now, locals.gym!.zone)
});
