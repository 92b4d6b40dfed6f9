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

/**
 * The classes that are full, about one popular one in three of the next ten days and an early one in
 * the Loft, and those that nearly are: as many, and the next that `member@` comes to.
 */
export function busyOnes(
	open: readonly SeedSlot[],
	[first, second, waits]: SeedSlot[],
	now: number
): { full: Set<number>; nearly: Set<number> } {
	const near = popular(open, now).filter(({ startsAt }) => startsAt < now + 240 * hourMs);
	const others = near.filter((slot) => slot !== first && slot !== second && slot !== waits);
	const some = others.filter((_, i) => i % 3 === 1);
	const nearly = [first!, ...others.filter((_, i) => i % 3 === 2)];
	const clashes = open.filter(({ isClash }) => isClash);
	const early = open.find(
		(slot) =>
			slot.type === 'intervals' &&
			slot.startsAt > now + 12 * hourMs &&
			!clashes.some((clash) => clash.startsOn === slot.startsOn)
	);
	const full = [...some, waits!, ...(early ? [early] : [])];
	const ids = (slots: SeedSlot[]) => new Set(slots.map(({ id }) => id));
	return { full: ids(full), nearly: ids(nearly) };
}
