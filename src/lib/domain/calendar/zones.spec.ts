import { execFileSync } from 'node:child_process';
import { describe, expect, it } from 'vitest';

/**
 * Each zone with both of its clock changes, a week of classes around each: at 18:00, and at the
 * skipped and the doubled time. The changes are the IANA zone database's for 2026; Casablanca's are
 * those of Ramadan. `gap` is a local time that does not occur, `fold` one that occurs twice.
 */
const zones = [
	{ zone: 'America/New_York', gap: '2026-03-08T02:30', fold: '2026-11-01T01:30' },
	{ zone: 'Europe/London', gap: '2026-03-29T01:30', fold: '2026-10-25T01:30' },
	{ zone: 'Australia/Sydney', gap: '2026-10-04T02:30', fold: '2026-04-05T02:30' },
	{ zone: 'America/Santiago', gap: '2026-09-06T00:30', fold: '2026-04-04T23:30' },
	{ zone: 'Australia/Lord_Howe', gap: '2026-10-04T02:15', fold: '2026-04-05T01:45' },
	{ zone: 'Africa/Casablanca', gap: '2026-03-22T02:30', fold: '2026-02-15T02:30' }
];
const serverZones = ['UTC', 'America/New_York', 'Australia/Lord_Howe'];

type Row = {
	zone: string;
	around: 'gap' | 'fold';
	time: string;
	on: string[];
	seen: { key: string; localStart: string; startsAt: number; isInGap: boolean }[];
	oracle: { at: number; local: string }[];
};

/** Runs in a process whose own zone is `tz`: only so is the server's zone really another. */
function runIn(tz: string): Row[] {
	const out = execFileSync(
		process.execPath,
		['--import', 'tsx', 'tests/support/expand-zones.ts', JSON.stringify(zones)],
		{ env: { ...process.env, TZ: tz }, encoding: 'utf8' }
	);
	return JSON.parse(out) as Row[];
}

describe.each(serverZones)('six zones across both clock changes, on a server in %s (G13)', (tz) => {
	const rows = runIn(tz);
	const shown = (row: Row) => row.seen.map((o) => o.localStart);

	it('has a row for each zone, change and time', () => {
		expect(rows.length).toBe(zones.length * 4);
		for (const row of rows) expect(row.seen.length).toBe(7);
	});

	it('keeps 18:00 at 18:00 in each week', () => {
		for (const row of rows.filter((r) => r.time === '18:00')) {
			expect(shown(row)).toEqual(row.on.map((on) => `${on}T18:00`));
			expect(row.seen.map((o) => localOf(o.startsAt, row.zone))).toEqual(
				row.on.map((on) => `${on} 18:00`)
			);
		}
	});

	it('is seen to reject classes that are read as instants a day apart', () => {
		const wrong = rows.filter((row) => row.time === '18:00' && isShiftedByDays(row));
		expect(wrong.length).toBe(zones.length * 2);
	});

	it('starts at the instants of Temporal, read `compatible`', () => {
		for (const row of rows) {
			expect(row.seen.map((o) => o.startsAt)).toEqual(row.oracle.map((o) => o.at));
			expect(shown(row)).toEqual(row.oracle.map((o) => o.local));
		}
	});

	it('moves a skipped time on by the length of the gap, on that day alone', () => {
		for (const { zone, gap } of zones) {
			const row = rows.find((r) => r.zone === zone && r.around === 'gap' && r.time !== '18:00')!;
			const moved = row.seen.filter((o) => o.isInGap);
			expect(moved.map((o) => o.key)).toEqual([gap]);
			const shift = Date.parse(`${moved[0]!.localStart}Z`) - Date.parse(`${gap}Z`);
			expect(shift).toBe((zone === 'Australia/Lord_Howe' ? 30 : 60) * 60_000);
		}
	});

	it('takes the first of a time that occurs twice, once', () => {
		for (const { zone, fold } of zones) {
			const row = rows.find((r) => r.zone === zone && r.around === 'fold' && r.time !== '18:00')!;
			const doubled = row.seen.filter((o) => o.localStart === fold);
			expect(doubled.length).toBe(1);
			const later = doubled[0]!.startsAt + (zone === 'Australia/Lord_Howe' ? 30 : 60) * 60_000;
			expect(localOf(later, zone)).toBe(fold.replace('T', ' '));
		}
	});

	it('makes no slot twice', () => {
		for (const row of rows) {
			expect(new Set(row.seen.map((o) => o.key)).size).toBe(row.seen.length);
			expect(new Set(row.seen.map((o) => o.startsAt)).size).toBe(row.seen.length);
		}
	});
});

/** Whether counting on by 24 hours from the first class would show another time than 18:00. */
const isShiftedByDays = ({ zone, seen }: Row): boolean =>
	seen.some((_, day) => !localOf(seen[0]!.startsAt + day * 86_400_000, zone).endsWith(' 18:00'));

/** By the platform's own formatter, not by the code that is looked at. */
const localOf = (at: number, zone: string): string =>
	new Intl.DateTimeFormat('sv-SE', {
		timeZone: zone,
		dateStyle: 'short',
		timeStyle: 'short'
	}).format(at);
