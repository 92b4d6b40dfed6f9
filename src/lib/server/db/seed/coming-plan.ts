import { weekOf } from '$lib/domain/calendar/civil-date';
import { daysBetween } from './days-between';
import { hourOf } from './diary';
import type { SeedSlot } from './timetable';

const hourMs = 3_600_000;

/** Evening classes, and Saturday's, that are an hour away or more. */
const popular = (open: readonly SeedSlot[], now: number): SeedSlot[] =>
	open.filter(
		(slot) =>
			(slot.type === 'strength' || slot.type === 'partners') &&
			(hourOf(slot) === 'evening' || slot.day === 5) &&
			slot.startsAt > now + hourMs
	);

/**
 * What `member@` finds: a place in the next evening, one later this week where there is one, a
 * turn on a waitlist, and a class next week that they gave up in time.
 */
export function forDemoMember(
	open: readonly SeedSlot[],
	now: number
): { books: SeedSlot[]; waits: SeedSlot; cancels: SeedSlot | undefined } {
	const all = popular(open, now);
	const first = all[0]!;
	const later = all.filter(({ startsOn }) => daysBetween(first.startsOn, startsOn) >= 1);
	const thisWeek = later.filter(({ startsOn }) => weekOf(startsOn) === weekOf(first.startsOn));
	const second =
		thisWeek.find(({ startsOn }) => daysBetween(first.startsOn, startsOn) >= 2) ??
		thisWeek[0] ??
		later[0]!;
	const waits = later.find(({ startsOn }) => startsOn !== second.startsOn)!;
	const taken = new Set([first, second, waits].map(({ startsOn }) => startsOn));
	const cancels = later.find(
		({ startsOn }) => !taken.has(startsOn) && daysBetween(first.startsOn, startsOn) >= 5
	);
	return { books: [first, second], waits, cancels };
}

/** The classes that are full: about one popular class in three of the next ten days, and an early one in the Loft. */
export function fullOnes(
	open: readonly SeedSlot[],
	[first, second, waits]: SeedSlot[],
	now: number
): Set<number> {
	const near = popular(open, now).filter(({ startsAt }) => startsAt < now + 240 * hourMs);
	const some = near.filter((slot, i) => i % 3 === 1 && slot !== first && slot !== second);
	const clashes = open.filter(({ isClash }) => isClash);
	const early = open.find(
		(slot) =>
			slot.type === 'intervals' &&
			slot.startsAt > now + 12 * hourMs &&
			!clashes.some((clash) => clash.startsOn === slot.startsOn)
	);
	return new Set([...some, waits!, ...(early ? [early] : [])].map(({ id }) => id));
}
