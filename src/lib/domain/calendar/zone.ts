import { Temporal } from 'temporal-polyfill';

/**
 * Between the gym's wall clock and instants (epoch ms). Every zone is an IANA name; a wall-clock
 * time is a civil date and "HH:MM", or the two as "YYYY-MM-DDTHH:MM".
 */

/** Whether `zone` is an IANA name that this machine knows; bare offsets are none. */
export function isZone(zone: string): boolean {
	if (!/^[A-Za-z]/.test(zone)) return false;
	try {
		Temporal.Instant.fromEpochMilliseconds(0).toZonedDateTimeISO(zone);
		return true;
	} catch {
		return false;
	}
}

/**
 * The instant that a wall-clock time means. A time that the spring change skips is read with the
 * offset before the gap, one that occurs twice is the first (RFC 5545 section 3.3.5, Temporal's
 * `compatible`).
 */
export const instantOf = (on: string, time: string, zone: string): number =>
	zoned(Temporal.PlainDateTime.from(`${on}T${time}`), zone).epochMilliseconds;

export const zoned = (local: Temporal.PlainDateTime, zone: string): Temporal.ZonedDateTime =>
	local.toZonedDateTime(zone, { disambiguation: 'compatible' });

/** What the gym's calendar and clock show at an instant; seconds are dropped. */
export function localOf(at: number, zone: string): { on: string; time: string } {
	const local = localText(
		Temporal.Instant.fromEpochMilliseconds(at).toZonedDateTimeISO(zone).toPlainDateTime()
	);
	return { on: local.slice(0, 10), time: local.slice(11, 16) };
}

/** The gym's civil date at an instant. */
export const localDateOf = (at: number, zone: string): string => localOf(at, zone).on;

/** "YYYY-MM-DDTHH:MM", with seconds only where there are any. */
export const localText = (local: Temporal.PlainDateTime): string =>
	local.toString({ smallestUnit: local.second === 0 ? 'minute' : 'second' });

/** The first instant of a civil day and the first after it: 23 to 25 hours apart as a rule. */
export function dayBounds(on: string, zone: string): { startsAt: number; endsAt: number } {
	const day = Temporal.PlainDate.from(on);
	return {
		startsAt: day.toZonedDateTime(zone).epochMilliseconds,
		endsAt: day.add({ days: 1 }).toZonedDateTime(zone).epochMilliseconds
	};
}

/**
 * What a clock change does to a wall-clock time: `skipped` is a time that does not occur and is
 * moved on, `twice` one that occurs twice, of which the first is meant.
 */
export function clockChangeAt(local: string, zone: string): 'skipped' | 'twice' | null {
	const wall = Temporal.PlainDateTime.from(local);
	const first = zoned(wall, zone);
	if (!first.toPlainDateTime().equals(wall)) return 'skipped';
	const last = wall.toZonedDateTime(zone, { disambiguation: 'later' });
	return first.epochMilliseconds === last.epochMilliseconds ? null : 'twice';
}
