import ICAL from 'ical.js';
import { describe, expect, it } from 'vitest';
import rules from '../../../../tests/support/check-values/ical-rules.json';
import { writeCalendar } from './calendar';
import type { FeedEntry } from './queries';

const facts = { name: 'Ropewalk Strength', origin: 'https://gym.test', host: 'gym.test' };
const entry = (given: Partial<FeedEntry> = {}): FeedEntry => ({
	id: 7,
	uid: '5f0c6a52-3f4e-4d0c-9d56-0c1f6f6f2a11',
	title: 'Pull day',
	room: 'Long Floor',
	coaches: 'Tomasz Wilk',
	startsAt: Date.UTC(2026, 9, 24, 17, 40),
	endsAt: Date.UTC(2026, 9, 24, 18, 40),
	createdAt: Date.UTC(2026, 8, 1, 8),
	modifiedAt: Date.UTC(2026, 9, 2, 9, 30),
	sequence: 0,
	cancelledAt: null,
	...given
});
const write = (entries: FeedEntry[], name = facts.name) =>
	writeCalendar(entries, { ...facts, name });
const unfold = (text: string) => text.replaceAll(/\r\n[ \t]/g, '');
const lineOf = (text: string, property: string) =>
	unfold(text)
		.split('\r\n')
		.find((line) => line.startsWith(`${property}:`));
const eventsOf = (text: string) =>
	new ICAL.Component(ICAL.parse(text))
		.getAllSubcomponents('vevent')
		.map((event) => new ICAL.Event(event));

/** A rule of ical-rules.json by its first words: the values come from the standard, not from us. */
function vector<T>(starts: string): T {
	const rule = rules.find((each) => each.rule.startsWith(starts));
	if (!rule || !('vector' in rule)) throw new Error(`no rule "${starts}"`);
	return rule.vector as T;
}

const hostile = [
	'Row\r\nEND:VEVENT\r\nBEGIN:VEVENT\r\nUID:stolen',
	'a\u2028ATTENDEE:mailto:x@y.z\u2029b\u0000c\u0007',
	'commas, semicolons; colons: "quotes" \\ backslashes \\n',
	'🏋️'.repeat(120),
	'x'.repeat(5000),
	';;;,,,\\\\\\',
	''
];

describe('a feed as RFC 5545 has it', () => {
	it('ends every line by CRLF and folds it at 75 octets, between characters (§3.1)', () => {
		const { unfolded } = vector<{ unfolded: string }>('lines <=75 octets');
		const title = unfolded.slice('SUMMARY:'.length);
		const text = write([entry({ title })]);
		expect(text.replaceAll('\r\n', '')).not.toMatch(/[\r\n]/);
		for (const line of text.split('\r\n')) {
			expect(Buffer.byteLength(line)).toBeLessThanOrEqual(75);
			expect(line).not.toContain('\uFFFD');
		}
		expect(lineOf(text, 'SUMMARY')).toBe(unfolded.replaceAll(',', '\\,'));
		expect(eventsOf(text)[0]?.summary).toBe(title);
	});

	it('escapes text as the standard does, colons and quotes left alone (§3.3.11)', () => {
		const { raw, escaped } = vector<{ raw: string; escaped: string }>('TEXT: escape');
		const oneLine = raw.replace('\n', ' ');
		const text = write([entry({ title: oneLine })]);
		expect(lineOf(text, 'SUMMARY')).toBe(`SUMMARY:${escaped.replace('\\n', ' ')}`);
		expect(eventsOf(text)[0]?.summary).toBe(oneLine);
	});

	it.each(hostile)('lets no text out of its property: %j', (words) => {
		const text = write([entry({ title: words, room: words, coaches: words })], words);
		const events = eventsOf(text);
		expect(events).toHaveLength(1);
		expect(events[0]?.uid).toBe(`${entry().uid}@gym.test`);
		expect(events[0]?.component.getAllProperties('attendee')).toEqual([]);
		expect(unfold(text).match(/^BEGIN:VEVENT/gm)).toHaveLength(1);
		expect(text.replaceAll('\r\n', '')).not.toMatch(/[\p{Cc}\u2028\u2029]/u);
	});

	it('has one UID and one DTSTAMP an event, both from the class: two readings are equal', () => {
		const text = write([entry(), entry({ uid: '0b6c2f5e', id: 8 })]);
		expect(text).toBe(write([entry(), entry({ uid: '0b6c2f5e', id: 8 })]));
		expect(text.match(/^UID:/gm)).toHaveLength(2);
		expect(text.match(/^DTSTAMP:20261002T093000Z/gm)).toHaveLength(2);
		expect(text.match(/^LAST-MODIFIED:20261002T093000Z/gm)).toHaveLength(2);
	});

	it('says instants in UTC and names no zone, so that none need be defined (§3.2.19)', () => {
		const text = write([entry()]);
		expect(lineOf(text, 'DTSTART')).toBe('DTSTART:20261024T174000Z');
		expect(lineOf(text, 'DTEND')).toBe('DTEND:20261024T184000Z');
		expect(text).not.toMatch(/TZID|VTIMEZONE/);
	});

	it('keeps a cancelled class, CANCELLED, with its UID and a higher SEQUENCE (§3.8.1.11, §3.8.7.4)', () => {
		const before = write([entry()]);
		const after = write([entry({ cancelledAt: Date.UTC(2026, 9, 3), sequence: 1 })]);
		expect([lineOf(before, 'STATUS'), lineOf(before, 'SEQUENCE')]).toEqual([
			'STATUS:CONFIRMED',
			'SEQUENCE:0'
		]);
		expect([lineOf(after, 'STATUS'), lineOf(after, 'SEQUENCE')]).toEqual([
			'STATUS:CANCELLED',
			'SEQUENCE:1'
		]);
		expect(lineOf(after, 'UID')).toBe(lineOf(before, 'UID'));
	});

	it('is a snapshot: no METHOD, nobody asked to answer (§3.7.2)', () => {
		expect(unfold(write([entry()]))).not.toMatch(/^(METHOD|ORGANIZER|ATTENDEE)/m);
	});

	it('asks to be read again once an hour at most (RFC 7986 §5.7)', () => {
		expect(unfold(write([entry()]))).toContain('REFRESH-INTERVAL;VALUE=DURATION:PT1H');
	});

	it('is a calendar even where there is nothing in it', () => {
		expect(eventsOf(write([]))).toEqual([]);
	});
});
