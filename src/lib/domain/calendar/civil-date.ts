/**
 * Arithmetic on civil dates ('YYYY-MM-DD') alone, small enough for every page.
 * What needs a zone or a clock is in zone.ts.
 */

const dayMs = 86_400_000;
const form = /^\d{4}-\d{2}-\d{2}$/;

/** Whether `text` is a civil date that exists (2027-02-29 does not). */
export function isCivilDate(text: string): boolean {
	if (!form.test(text)) return false;
	const ms = Date.parse(`${text}T00:00:00Z`);
	return !Number.isNaN(ms) && new Date(ms).toISOString().startsWith(text);
}

/** The civil date `days` later; earlier where negative. */
export function addDays(date: string, days: number): string {
	return new Date(Date.parse(`${date}T00:00:00Z`) + days * dayMs).toISOString().slice(0, 10);
}

/** ISO 8601 weekday: 1 is Monday, 7 is Sunday. */
export function weekday(date: string): number {
	return new Date(`${date}T00:00:00Z`).getUTCDay() || 7;
}

/** First day of the week that holds `date`, where weeks start on `weekStartsOn` (ISO 8601, 1 to 7). */
export function weekOf(date: string, weekStartsOn = 1): string {
	return addDays(date, -((weekday(date) - weekStartsOn + 7) % 7));
}

/** `count` civil dates from `date` on. */
export function daysFrom(date: string, count: number): string[] {
	return Array.from({ length: count }, (_, i) => addDays(date, i));
}
