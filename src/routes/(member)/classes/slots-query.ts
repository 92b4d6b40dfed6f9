import { QueryClient } from '@tanstack/svelte-query';
import { browser } from '$app/environment';
import type { TimetableSlot } from '$lib/components/calendar/timetable-slot';

const settings = { defaultOptions: { queries: { enabled: browser, staleTime: 15_000 } } };
const shared = browser ? new QueryClient(settings) : null;

/** One cache for the visit in a browser, one for each request on the server. */
export const slotsClient = (): QueryClient => shared ?? new QueryClient(settings);

/** The timetable of the civil dates from `from` to `to`, both included. */
export function slotsQuery(fetchFrom: typeof fetch, from: string, to: string) {
	return {
		queryKey: ['slots', from, to],
		queryFn: async (): Promise<TimetableSlot[]> => {
			const answer = await fetchFrom(`/api/slots?from=${from}&to=${to}`);
			if (!answer.ok) throw new Error(`The timetable answered ${answer.status}`);
			return (await answer.json()).slots;
		}
	};
}
