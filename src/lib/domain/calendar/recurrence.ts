import { refuse, type Refused } from '../refusal';
import { addDays, isCivilDate } from './civil-date';
import type { ClosedDays } from './closures';
import { readRule, type RuleRefused } from './read-rule';
import type { Rule } from './rule';
import { floatingMs, isZone, localText } from './zone';

/** Where a single occurrence was moved to, by hand. */
export type Moved = { startLocal: string; lengthMin?: number };

export type Recurrence = {
	/** Wall-clock start, "YYYY-MM-DDTHH:MM" (or with seconds, or as RFC 5545 writes it: "19970902T090000"). */
	startLocal: string;
	/** IANA zone of the wall clock. */
	zone: string;
	/** RFC 5545 RRULE value within what `readRule` takes; null is one occurrence. */
	rule: string | null;
	/** Minutes of real time, 0 to 1440; 0 unless said. */
	lengthMin?: number;
	/** First and last civil day that is wanted, both included. */
	fromOn?: string;
	toOn?: string;
	/** How many at most: 400 unless said, 5000 at most. */
	limit?: number;
	/** Original local starts that are left out (RFC 5545 EXDATE). */
	exdates?: readonly string[];
	/** Days without occurrences, of the gym or of `roomId`. */
	closures?: readonly ClosedDays[];
	roomId?: number | null;
	/** By original local start: where an occurrence was moved to; and those that were called off. */
	moved?: Readonly<Record<string, Moved>>;
	cancelled?: readonly string[];
};

/** A recurrence whose every part was read; keys are original local starts as `localText` writes them. */
export type ReadRecurrence = {
	/** Floating ms, like every wall-clock time here. */
	start: number;
	zone: string;
	rule: Rule;
	lengthMin: number;
	fromOn: string | null;
	toOn: string | null;
	limit: number;
	closures: readonly ClosedDays[];
	roomId: number | null;
	moved: ReadonlyMap<string, { wall: number; lengthMin: number }>;
	/** Left out or called off. */
	left: ReadonlySet<string>;
};

export type RecurrenceRefused =
	RuleRefused | Refused<'unknown-zone' | 'bad-start' | 'bad-length' | 'bad-range'>;

const longestMin = 1440;
const mostOccurrences = 5000;
const once: Rule = {
	frequency: 'DAILY',
	interval: 1,
	count: 1,
	until: null,
	days: [],
	monthDays: [],
	months: [],
	weekStart: 'MO'
};

export function readRecurrence(
	asked: Recurrence
): { ok: true; recurrence: ReadRecurrence } | RecurrenceRefused {
	const { zone, rule, lengthMin = 0, limit = 400, fromOn, toOn } = asked;
	const start = readLocal(asked.startLocal);
	if (start === undefined) return refuse('bad-start', { start: asked.startLocal.slice(0, 30) });
	if (!isZone(zone)) return refuse('unknown-zone', { zone: zone.slice(0, 60) });
	if (!isWhole(lengthMin, 0, longestMin)) return refuse('bad-length', { most: longestMin });
	if (!isWhole(limit, 1, mostOccurrences)) return refuse('bad-range', { most: mostOccurrences });
	if ([fromOn, toOn].some((on) => on !== undefined && !isCivilDate(on))) return refuse('bad-range');
	const read = rule === null ? { ok: true as const, rule: once } : readRule(rule);
	if (!read.ok) return read;
	const changes = readChanges(asked, lengthMin);
	if (!changes) return refuse('bad-start');
	const { closures = [], roomId = null } = asked;
	const range = { fromOn: fromOn ?? null, toOn: toOn ?? null, limit };
	return {
		ok: true,
		recurrence: { start, zone, rule: read.rule, lengthMin, ...range, closures, roomId, ...changes }
	};
}

const isWhole = (value: number, least: number, most: number): boolean =>
	Number.isInteger(value) && value >= least && value <= most;

/** A wall-clock time of the years 1970 to 2199; undefined where it cannot be read. */
function readLocal(text: string): number | undefined {
	const form = /^(\d{4})-?(\d{2})-?(\d{2})T([01]\d|2[0-3]):?([0-5]\d)(?::?([0-5]\d))?$/;
	const [, year = '', month, day, hour, minute, second = '00'] = form.exec(text) ?? [];
	const on = `${year}-${month}-${day}`;
	if (year < '1970' || year > '2199' || !isCivilDate(on)) return undefined;
	return floatingMs(`${on}T${hour}:${minute}:${second}`);
}

function readChanges(
	{ exdates = [], cancelled = [], moved = {} }: Recurrence,
	usualMin: number
): Pick<ReadRecurrence, 'moved' | 'left'> | null {
	const left = [...exdates, ...cancelled].map(readLocal);
	const pairs = Object.entries(moved).map(([key, to]) => ({
		key: readLocal(key),
		wall: readLocal(to.startLocal),
		lengthMin: to.lengthMin ?? usualMin
	}));
	const read = new Map<string, { wall: number; lengthMin: number }>();
	for (const pair of pairs) {
		const { key, wall, lengthMin } = pair;
		if (key === undefined || wall === undefined || !isWhole(lengthMin, 0, longestMin)) return null;
		read.set(localText(key), { wall, lengthMin });
	}
	if (!left.every((wall) => wall !== undefined)) return null;
	return { moved: read, left: new Set(left.map(localText)) };
}

/** The civil days between which original starts are looked for, with a day to spare for clock changes. */
export function searchedDays({ fromOn, toOn, moved }: ReadRecurrence): {
	firstOn: string | null;
	lastOn: string | null;
} {
	const days = [...moved.keys()].map((key) => key.slice(0, 10));
	const first = fromOn && [fromOn, ...days].reduce((a, b) => (a < b ? a : b));
	const last = toOn && [toOn, ...days].reduce((a, b) => (a > b ? a : b));
	return { firstOn: first && addDays(first, -1), lastOn: last };
}
