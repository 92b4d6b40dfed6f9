import { refuse, type Refused } from '../refusal';
import { visitStarts } from './candidates';
import { isClosedOn } from './closures';
import {
	readRecurrence,
	searchedDays,
	type ReadRecurrence,
	type Recurrence,
	type RecurrenceRefused
} from './recurrence';
import { floatingMs, localText, placeOnClock } from './zone';

export type Occurrence = {
	/** The original local start, "YYYY-MM-DDTHH:MM": what an occurrence is known by, moved or not. */
	key: string;
	/** When it takes place on the wall clock: `startsOn` and `startTime` in one. */
	localStart: string;
	startsOn: string;
	startTime: string;
	/** Instants, epoch ms. */
	startsAt: number;
	endsAt: number;
	/** A clock change skips its wall-clock time: it starts that much later. */
	isInGap: boolean;
};

export type OccurrencesRefused = RecurrenceRefused | Refused<'ends-before-start'>;

/**
 * When a series takes place, in order of start.
 *
 * The rule is expanded on the wall clock, and each local start turned into an instant with the
 * offset before a gap and the first of two (Temporal's `compatible`): a class at 18:00 stays at
 * 18:00. UNTIL is included: an instant is compared as such, a civil day lasts to its end on the
 * gym's calendar. The start itself is an occurrence only where the rule falls on it (RFC 5545
 * leaves another start undefined), and COUNT counts from the first that falls. Days closed, left
 * out or called off still use up the COUNT, as EXDATE does. Without `toOn` an endless rule is read
 * to `limit`.
 *
 * `more` is true where the reading stopped at `limit`, or after sixteen years, before the rule or
 * the range ended. A refusal says what could not be read.
 */
export function occurrences(
	asked: Recurrence
): { ok: true; occurrences: Occurrence[]; more: boolean } | OccurrencesRefused {
	const read = readRecurrence(asked);
	if (!read.ok) return read;
	const { recurrence } = read;
	if (isPast(recurrence.start, recurrence)) return refuse('ends-before-start');
	const { found, more } = collect(recurrence);
	found.sort((a, b) => a.startsAt - b.startsAt);
	return { ok: true, occurrences: found.filter(isNotDoubled), more };
}

function collect(recurrence: ReadRecurrence): { found: Occurrence[]; more: boolean } {
	const { firstOn, lastOn } = searchedDays(recurrence);
	const { rule, limit } = recurrence;
	const found: Occurrence[] = [];
	let counted = 0;
	let isFull = false;
	const firstMs = firstOn ? floatingMs(`${firstOn}T00:00`) : recurrence.start;
	const isWhole = visitStarts(recurrence.start, rule, firstMs, (wall) => {
		if (lastOn && localText(wall).slice(0, 10) > lastOn) return false;
		if (isPast(wall, recurrence)) return false;
		counted += 1;
		const occurrence = wall < firstMs ? null : wanted(wall, recurrence);
		isFull = occurrence !== null && found.length === limit;
		if (isFull) return false;
		if (occurrence) found.push(occurrence);
		return counted !== rule.count;
	});
	return { found, more: isFull || !isWhole };
}

/** Whether a wall-clock start lies beyond the rule's end. */
function isPast(wall: number, { rule: { until }, zone }: ReadRecurrence): boolean {
	if (!until) return false;
	if (until.kind === 'date') return localText(wall).slice(0, 10) > until.on;
	if (until.kind === 'local') return wall > floatingMs(until.local);
	return placeOnClock(wall, zone).at > until.at;
}

/** The occurrence with this original start, where and when it takes place; null where it does not, or not in the range. */
function wanted(original: number, recurrence: ReadRecurrence): Occurrence | null {
	const key = localText(original);
	if (recurrence.left.has(key)) return null;
	const { wall, lengthMin } = recurrence.moved.get(key) ?? {
		wall: original,
		lengthMin: recurrence.lengthMin
	};
	const { at, floatingMs: shown } = placeOnClock(wall, recurrence.zone);
	const localStart = localText(shown);
	const startsOn = localStart.slice(0, 10);
	const { fromOn, toOn, closures, roomId } = recurrence;
	const isOutside = (fromOn && startsOn < fromOn) || (toOn && startsOn > toOn);
	if (isOutside || isClosedOn(closures, startsOn, roomId)) return null;
	return {
		key,
		localStart,
		startsOn,
		startTime: localStart.slice(11, 16),
		startsAt: at,
		endsAt: at + lengthMin * 60_000,
		isInGap: shown !== wall
	};
}

/** A zone that skips a whole day pushes its occurrence onto the next day's: that one stays alone. */
const isNotDoubled = (occurrence: Occurrence, i: number, all: readonly Occurrence[]): boolean =>
	!(occurrence.isInGap && all[i + 1]?.startsAt === occurrence.startsAt);
