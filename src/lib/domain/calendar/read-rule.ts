import { refuse, type Refused } from '../refusal';
import { isCivilDate } from './civil-date';
import {
	longestRule,
	mostCount,
	mostInterval,
	weekdays,
	type Frequency,
	type Rule,
	type RuleDay,
	type Until,
	type Weekday
} from './rule';

/**
 * Why a rule is not taken: `too-long` (over 256 characters), `form` (not parts of NAME=value, or
 * without FREQ), `frequency` (not daily, weekly or monthly), `part` (a part that is not allowed:
 * BYHOUR, BYMINUTE, BYSECOND, BYSETPOS, BYYEARDAY, BYWEEKNO, or unknown), `twice`, `value`,
 * `two-ends` (UNTIL beside COUNT), `mix` (a part that this frequency does not take).
 */
export type RuleReason =
	'too-long' | 'form' | 'frequency' | 'part' | 'twice' | 'value' | 'two-ends' | 'mix';
/** `detail` has `reason` (a RuleReason) and `part`, the name concerned. */
export type RuleRefused = Refused<'rule-unreadable'>;

export const because = (reason: RuleReason, part = ''): RuleRefused =>
	refuse('rule-unreadable', { reason, part: part.slice(0, 20) });

/** Each allowed part, and how its value is read; undefined is no value of it. */
const readers = {
	FREQ: (text: string): Frequency | undefined => frequencies.find((f) => f === text),
	INTERVAL: (text: string) => number(text, 1, mostInterval),
	COUNT: (text: string) => number(text, 1, mostCount),
	UNTIL: readUntil,
	WKST: (text: string): Weekday | undefined => weekdays.find((day) => day === text),
	BYDAY: (text: string) => list(text, 35, readDay),
	BYMONTHDAY: (text: string) => list(text, 62, (day) => signed(day, 31)),
	BYMONTH: (text: string) => list(text, 12, (month) => number(month, 1, 12))
};
const frequencies: readonly Frequency[] = ['DAILY', 'WEEKLY', 'MONTHLY'];
type Name = keyof typeof readers;
type Read = { [N in Name]?: Exclude<ReturnType<(typeof readers)[N]>, undefined> };

/**
 * Reads an RFC 5545 RRULE value ("FREQ=WEEKLY;BYDAY=MO,WE", with or without "RRULE:" before it)
 * within what a timetable needs: DAILY, WEEKLY or MONTHLY, INTERVAL to 52, COUNT to 400 or UNTIL,
 * BYDAY (with an ordinal, -5 to 5, in MONTHLY alone), BYMONTHDAY (not in WEEKLY), BYMONTH, WKST;
 * 256 characters. The limits keep a hostile rule from hanging whoever expands it.
 */
export function readRule(text: string): { ok: true; rule: Rule } | RuleRefused {
	if (text.length > longestRule) return because('too-long');
	const read: Read = {};
	for (const part of text
		.toUpperCase()
		.replace(/^RRULE:/, '')
		.split(';')) {
		const [name = '', value, ...rest] = part.split('=');
		if (!value || rest.length > 0) return because('form', name);
		if (!isName(name)) return because('part', name);
		if (read[name] !== undefined) return because('twice', name);
		const found = readers[name](value);
		if (found === undefined) return because(name === 'FREQ' ? 'frequency' : 'value', name);
		Object.assign(read, { [name]: found });
	}
	return assemble(read);
}

const isName = (name: string): name is Name => Object.hasOwn(readers, name);

function assemble(read: Read): { ok: true; rule: Rule } | RuleRefused {
	const { FREQ: frequency, BYDAY: days = [], BYMONTHDAY: monthDays = [] } = read;
	if (!frequency) return because('form', 'FREQ');
	if (read.COUNT !== undefined && read.UNTIL !== undefined) return because('two-ends', 'UNTIL');
	const hasOrdinal = days.some((day) => day.ordinal !== null);
	if (frequency !== 'MONTHLY' && hasOrdinal) return because('mix', 'BYDAY');
	if (frequency === 'WEEKLY' && monthDays.length > 0) return because('mix', 'BYMONTHDAY');
	const rule = {
		frequency,
		interval: read.INTERVAL ?? 1,
		count: read.COUNT ?? null,
		until: read.UNTIL ?? null,
		days,
		monthDays,
		months: read.BYMONTH ?? [],
		weekStart: read.WKST ?? 'MO'
	};
	return { ok: true, rule };
}

function number(text: string, least: number, most: number): number | undefined {
	if (!/^\d{1,3}$/.test(text)) return undefined;
	const value = Number(text);
	return value >= least && value <= most ? value : undefined;
}

function signed(text: string, most: number): number | undefined {
	const value = number(text.replace(/^[+-]/, ''), 1, most);
	return value !== undefined && text.startsWith('-') ? -value : value;
}

/** A list of values, each once, in the order given. */
function list<T>(
	text: string,
	most: number,
	read: (item: string) => T | undefined
): T[] | undefined {
	const items = [...new Set(text.split(','))];
	if (items.length > most) return undefined;
	const values = items.map(read);
	return values.every((value) => value !== undefined) ? values : undefined;
}

function readDay(text: string): RuleDay | undefined {
	const day = weekdays.find((name) => name === text.slice(-2));
	if (!day) return undefined;
	if (text.length === 2) return { ordinal: null, day };
	const ordinal = signed(text.slice(0, -2), 5);
	return ordinal === undefined ? undefined : { ordinal, day };
}

/** "20261224", "20261224T180000" or "20261224T180000Z". */
function readUntil(text: string): Until | undefined {
	const found = /^(\d{4})(\d{2})(\d{2})(?:T(\d{2})(\d{2})(\d{2})(Z?))?$/.exec(text);
	if (!found) return undefined;
	const [, year, month, day, hour, minute, second, zulu] = found;
	const on = `${year}-${month}-${day}`;
	if (!isCivilDate(on)) return undefined;
	if (hour === undefined) return { kind: 'date', on };
	if (hour > '23' || minute! > '59' || second! > '59') return undefined;
	const local = `${on}T${hour}:${minute}:${second}`;
	return zulu ? { kind: 'instant', at: Date.parse(`${local}Z`) } : { kind: 'local', local };
}
