import { Temporal } from 'temporal-polyfill';
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
import { localText, zoned } from './zone';

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
 * `more` is true where the reading stopped at `limit`, or after eleven years of days, before the
 * rule or the range ended. A refusal says what could not be read.
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
	const startMs = floatingMs(localText(recurrence.start));
	const firstMs = firstOn ? floatingMs(`${firstOn}T00:00`) : startMs;
	const isWhole = visitStarts(startMs, rule, firstMs, (localMs) => {
		const text = new Date(localMs).toISOString().slice(0, 19);
		if (lastOn && text.slice(0, 10) > lastOn) return false;
		const local = Temporal.PlainDateTime.from(text);
		if (isPast(local, recurrence)) return false;
		counted += 1;
		const occurrence = firstOn && text.slice(0, 10) < firstOn ? null : wanted(local, recurrence);
		isFull = occurrence !== null && found.length === limit;
		if (isFull) return false;
		if (occurrence) found.push(occurrence);
		return counted !== rule.count;
	});
	return { found, more: isFull || !isWhole };
}

/** Local times are held as if they were UTC while the rule is expanded. */
const floatingMs = (local: string): number => Date.parse(`${local}Z`);

/** Whether a local start lies beyond the rule's end. */
function isPast(local: Temporal.PlainDateTime, { rule, zone }: ReadRecurrence): boolean {
	const { until } = rule;
	if (!until) return false;
	if (until.kind === 'date') return local.toPlainDate().toString() > until.on;
	if (until.kind === 'local') return Temporal.PlainDateTime.compare(local, until.local) > 0;
	return zoned(local, zone).epochMilliseconds > until.at;
}

/** The occurrence with this original start, where and when it takes place; null where it does not, or not in the range. */
function wanted(original: Temporal.PlainDateTime, recurrence: ReadRecurrence): Occurrence | null {
	const key = localText(original);
	if (recurrence.left.has(key)) return null;
	const { local, lengthMin } = recurrence.moved.get(key) ?? {
		local: original,
		lengthMin: recurrence.lengthMin
	};
	const start = zoned(local, recurrence.zone);
	const takesPlace = start.toPlainDateTime();
	const localStart = localText(takesPlace);
	const startsOn = localStart.slice(0, 10);
	const { fromOn, toOn, closures, roomId } = recurrence;
	const isOutside = (fromOn && startsOn < fromOn) || (toOn && startsOn > toOn);
	if (isOutside || isClosedOn(closures, startsOn, roomId)) return null;
	const startsAt = start.epochMilliseconds;
	return {
		key,
		localStart,
		startsOn,
		startTime: localStart.slice(11, 16),
		startsAt,
		endsAt: startsAt + lengthMin * 60_000,
		isInGap: !takesPlace.equals(local)
	};
}

/** A zone that skips a whole day pushes its occurrence onto the next day's: that one stays alone. */
const isNotDoubled = (occurrence: Occurrence, i: number, all: readonly Occurrence[]): boolean =>
	!(occurrence.isInGap && all[i + 1]?.startsAt === occurrence.startsAt);
