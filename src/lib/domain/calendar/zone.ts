import { Temporal } from 'temporal-polyfill';

/**
 * Between the gym's wall clock and instants (epoch ms). Every zone is an IANA name; a wall-clock
 * time is a civil date and "HH:MM", or the two as "YYYY-MM-DDTHH:MM". In between, wall-clock times
 * are numbers too: `floatingMs` is the epoch ms that the same figures would be in UTC, so that no
 * zone of the server can shift them.
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
	placeOnClock(floatingMs(`${on}T${time}`), zone).at;

/** What the gym's calendar and clock show at an instant; seconds are dropped. */
export function localOf(at: number, zone: string): { on: string; time: string } {
	const zoned = Temporal.Instant.fromEpochMilliseconds(at).toZonedDateTimeISO(zone);
	const local = new Date(at + zoned.offsetNanoseconds / 1e6).toISOString();
	return { on: local.slice(0, 10), time: local.slice(11, 16) };
}

/** The gym's civil date at an instant. */
export const localDateOf = (at: number, zone: string): string => localOf(at, zone).on;

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
	const wall = floatingMs(local);
	const first = placeOnClock(wall, zone);
	if (first.floatingMs !== wall) return 'skipped';
	return placeOnClock(wall, zone, 'later').at === first.at ? null : 'twice';
}

/** The instant of a wall-clock time, and what the clock shows at that instant: another time in a gap. */
export function placeOnClock(
	wall: number,
	zone: string,
	disambiguation: 'compatible' | 'later' = 'compatible'
): { at: number; floatingMs: number } {
	const d = new Date(wall);
	const zoned = new Temporal.PlainDateTime(
		d.getUTCFullYear(),
		d.getUTCMonth() + 1,
		d.getUTCDate(),
		d.getUTCHours(),
		d.getUTCMinutes(),
		d.getUTCSeconds()
	).toZonedDateTime(zone, { disambiguation });
	const at = zoned.epochMilliseconds;
	return { at, floatingMs: at + zoned.offsetNanoseconds / 1e6 };
}

export const floatingMs = (local: string): number => Date.parse(`${local}Z`);

/** "YYYY-MM-DDTHH:MM", with seconds only where there are any. */
export function localText(wall: number): string {
	const text = new Date(wall).toISOString();
	return text.slice(17, 19) === '00' ? text.slice(0, 16) : text.slice(0, 19);
}
