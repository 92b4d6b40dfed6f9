import { nextDates } from '$lib/domain/calendar/next-dates';
import type { PickedDates } from '$lib/domain/calendar/next-dates';
import { localDateOf } from '$lib/domain/calendar/zone';
import type { DatesAnswer } from './dates';

type Place = { gym: { zone: string; weekStartsOn: number } | null; now: number };

/** The next dates of a picked rule, worked out on the server by the rule that the browser uses. */
export function answerDates(picked: PickedDates | null, { gym, now }: Place): DatesAnswer | null {
	if (!picked || !gym) return null;
	const { zone, weekStartsOn } = gym;
	return nextDates(picked, { zone, weekStartsOn, fromOn: localDateOf(now, zone) });
}
