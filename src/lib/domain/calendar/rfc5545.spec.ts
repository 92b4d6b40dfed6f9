import { describe, expect, it } from 'vitest';
import values from '../../../../tests/support/check-values/rrule.json';
import { occurrences, readRule } from '.';

type Row = (typeof values.rules)[number] & { exdate?: string[] };
const rows: Row[] = values.rules;
const isAllowed = (row: Row) => readRule(row.rrule).ok;
const askedOf = (row: Row) => ({
	startLocal: row.dtstart,
	zone: row.tzid,
	rule: row.rrule,
	exdates: row.exdate,
	limit: row.complete ? undefined : row.expected.length
});

describe('the examples of RFC 5545 that fall in what is allowed', () => {
	it('are 27 of the 46', () => {
		expect(rows.length).toBe(46);
		expect(rows.filter(isAllowed).length).toBe(27);
	});

	it.each(rows.filter(isAllowed))('$id $title: $rrule', (row) => {
		const result = occurrences(askedOf(row));
		if (!result.ok) throw new Error(result.refused);
		expect(result.occurrences.map((o) => `${o.localStart}:00`)).toEqual(row.expected);
		expect(result.occurrences.map((o) => `${o.key}:00`)).toEqual(row.expected);
		expect(result.more).toBe(!row.complete);
	});
});

describe('the examples of RFC 5545 that are not allowed', () => {
	const reasons: [RegExp, string, string][] = [
		[/^FREQ=(YEARLY|HOURLY|MINUTELY)/, 'frequency', 'FREQ'],
		[/BYSETPOS/, 'part', 'BYSETPOS'],
		[/BYHOUR/, 'part', 'BYHOUR']
	];

	it.each(rows.filter((row) => !isAllowed(row)))('$id $title: $rrule', (row) => {
		const [, reason, part] = reasons.find(([rule]) => rule.test(row.rrule))!;
		expect(occurrences(askedOf(row))).toEqual({
			ok: false,
			refused: 'rule-unreadable',
			detail: { reason, part }
		});
	});
});

describe('clock changes', () => {
	it.each(values.dst)('$id ($source)', ({ dtstart, tzid, rrule, expectedUtc }) => {
		const result = occurrences({ startLocal: dtstart, zone: tzid, rule: rrule });
		if (!result.ok) throw new Error(result.refused);
		const instants = result.occurrences.map((o) => new Date(o.startsAt).toISOString());
		expect(instants).toEqual(expectedUtc.map((utc) => utc.replace('Z', '.000Z')));
	});
});
