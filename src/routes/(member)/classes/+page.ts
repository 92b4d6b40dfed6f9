import { browser } from '$app/environment';
import { addDays, isCivilDate, weekOf } from '$lib/domain/calendar/civil-date';
import { slotsClient, slotsQuery } from './slots-query';
import type { PageLoad } from './$types';

let hydrated = false;

/** On the first page the slots come with it; later weeks are fetched while their skeleton shows. */
export const load: PageLoad = async ({ url, data, fetch, parent }) => {
	const { gym } = await parent();
	const asked = url.searchParams.get('day') ?? '';
	const dayOn = isCivilDate(asked) ? asked : data.todayOn;
	const weekOn = weekOf(dayOn, gym?.weekStartsOn);
	const queryClient = slotsClient();
	const fetched = queryClient.prefetchQuery(slotsQuery(fetch, weekOn, addDays(weekOn, 7)));
	if (!browser || !hydrated) await fetched;
	hydrated = browser;
	return { ...data, dayOn, weekOn, queryClient };
};
