import { Frequency, RRule, Weekday as LibraryWeekday } from 'rrule/dist/esm/index.js';
import { weekdays, type Rule } from './rule';

/**
 * How far a rule is read at most, from its start or from where the reading begins: a rule that
 * never falls ends there, within the 50 ms of goal G23, and 400 times every second week fit in.
 */
const mostYears = 16;

const dayMs = 86_400_000;

/**
 * Visits the local starts of a rule in order until `visit` answers false. Local times are held as
 * if they were UTC, so that no zone of the server or of the gym can shift them.
 *
 * The library walks through periods and days; what narrows a rule down (BYMONTH, BYMONTHDAY beside
 * BYDAY, a day that not each month has) is checked here, since the library searches to the year
 * 9999 for a rule that never falls. Each period yields at least one candidate: in months, an extra
 * first day or first Monday.
 * @returns false where the reading stopped before the rule or `visit` did
 */
export function visitStarts(
	startMs: number,
	rule: Rule,
	fromMs: number,
	visit: (localMs: number) => boolean
): boolean {
	const whole = withStartsDay(rule, startMs);
	const beginsMs = rule.count === null ? Math.max(startMs, fromMs) : startMs;
	const lastMs = beginsMs + mostYears * 366 * dayMs;
	let isWhole = true;
	walker(whole, skipTo(startMs, whole, fromMs)).all((candidate) => {
		if (candidate.getTime() > lastMs) return (isWhole = false);
		return falls(candidate, whole) ? visit(candidate.getTime()) : true;
	});
	return isWhole;
}

/** A rule that leaves its day to the start, with that day said. */
function withStartsDay(rule: Rule, startMs: number): Rule {
	const start = new Date(startMs);
	if (rule.days.length > 0 || rule.monthDays.length > 0) return rule;
	if (rule.frequency === 'WEEKLY')
		return { ...rule, days: [{ ordinal: null, day: weekdays[mondayFirst(start)]! }] };
	if (rule.frequency === 'MONTHLY') return { ...rule, monthDays: [start.getUTCDate()] };
	return rule;
}

/** Moves an endless rule's start on by whole intervals; one with a count must be read from its start. */
function skipTo(startMs: number, rule: Rule, fromMs: number): number {
	if (rule.count !== null || fromMs <= startMs) return startMs;
	const days = Math.floor((fromMs - startMs) / dayMs);
	if (rule.frequency === 'MONTHLY') return skipMonths(startMs, rule.interval, fromMs);
	const period = rule.interval * (rule.frequency === 'WEEKLY' ? 7 : 1);
	return startMs + Math.max(0, Math.floor(days / period) - 1) * period * dayMs;
}

function skipMonths(startMs: number, interval: number, fromMs: number): number {
	const start = new Date(startMs);
	const from = new Date(fromMs);
	const months =
		12 * (from.getUTCFullYear() - start.getUTCFullYear()) +
		(from.getUTCMonth() - start.getUTCMonth());
	const skipped = (Math.floor(months / interval) - 1) * interval;
	if (skipped <= 0) return startMs;
	const first = Date.UTC(start.getUTCFullYear(), start.getUTCMonth() + skipped, 1);
	return first + (((startMs % dayMs) + dayMs) % dayMs);
}

const everyDay = Array.from({ length: 31 }, (_, day) => day + 1);

function walker(rule: Rule, startMs: number): RRule {
	const options = {
		dtstart: new Date(startMs),
		interval: rule.interval,
		wkst: weekdays.indexOf(rule.weekStart)
	};
	if (rule.frequency === 'DAILY' && rule.interval === 1)
		// The library reads months of all their days eight times as fast as days.
		return new RRule({ ...options, freq: Frequency.MONTHLY, bymonthday: everyDay }, true);
	if (rule.frequency === 'DAILY') return new RRule({ ...options, freq: Frequency.DAILY }, true);
	if (rule.frequency === 'WEEKLY')
		return new RRule({ ...options, freq: Frequency.WEEKLY, byweekday: libraryDays(rule) }, true);
	const monthly =
		rule.monthDays.length > 0
			? { bymonthday: [...rule.monthDays, 1] }
			: { byweekday: [...libraryDays(rule), new LibraryWeekday(0, 1)] };
	return new RRule({ ...options, freq: Frequency.MONTHLY, ...monthly }, true);
}

/** In months a plain weekday is said as its five ordinals: the library reads "MO,1FR" as both at once. */
function libraryDays({ frequency, days }: Rule): LibraryWeekday[] {
	const each = frequency === 'MONTHLY' ? [1, 2, 3, 4, 5] : [undefined];
	return days.flatMap(({ ordinal, day }) =>
		(ordinal === null ? each : [ordinal]).map((n) => new LibraryWeekday(weekdays.indexOf(day), n))
	);
}

/** Whether a day is one of the rule's: month, day of the month and weekday must each agree. */
function falls(local: Date, { months, monthDays, days }: Rule): boolean {
	const day = local.getUTCDate();
	const fromEnd = day - daysInMonth(local) - 1;
	const weekday = weekdays[mondayFirst(local)];
	const nth = Math.ceil(day / 7);
	const nthFromEnd = -Math.ceil(-fromEnd / 7);
	return (
		(months.length === 0 || months.includes(local.getUTCMonth() + 1)) &&
		(monthDays.length === 0 || monthDays.includes(day) || monthDays.includes(fromEnd)) &&
		(days.length === 0 ||
			days.some(
				(d) =>
					d.day === weekday && (d.ordinal === null || d.ordinal === nth || d.ordinal === nthFromEnd)
			))
	);
}

const mondayFirst = (local: Date): number => (local.getUTCDay() + 6) % 7;

const daysInMonth = (local: Date): number =>
	new Date(Date.UTC(local.getUTCFullYear(), local.getUTCMonth() + 1, 0)).getUTCDate();
