import { addDays } from '../calendar/civil-date';
import { dayBounds, instantOf } from '../calendar/zone';

/** A slot's start: the instant (epoch ms) and the civil day it has on the gym's calendar. */
type Start = { startsAt: number; startsOn: string; zone: string };

const minuteMs = 60_000;

/**
 * From when to when a class can be booked, both instants included. It opens with the first moment
 * of the gym's day so many days before; it closes so many minutes before the start.
 */
export function bookingWindow({
	startsAt,
	startsOn,
	zone,
	opensDaysBefore,
	closesMinBefore
}: Start & { opensDaysBefore: number; closesMinBefore: number }): {
	opensAt: number;
	closesAt: number;
} {
	return {
		opensAt: dayBounds(addDays(startsOn, -opensDaysBefore), zone).startsAt,
		closesAt: startsAt - closesMinBefore * minuteMs
	};
}

/**
 * The last instant at which a cancellation is in time: minutes before the start, or a clock time
 * ("HH:MM") on the day before. Exactly one of the two is set; with neither it is the start itself.
 */
export function cutOffAt({
	startsAt,
	startsOn,
	zone,
	cutOffMin,
	cutOffClock
}: Start & { cutOffMin: number | null; cutOffClock: string | null }): number {
	if (cutOffClock !== null) return instantOf(addDays(startsOn, -1), cutOffClock, zone);
	return startsAt - (cutOffMin ?? 0) * minuteMs;
}

/** What a cancellation at `now` is: at the cut-off itself it is still in time. */
export const cancelKind = (now: number, cutOffAt: number): 'cancelled' | 'late-cancelled' =>
	now <= cutOffAt ? 'cancelled' : 'late-cancelled';
