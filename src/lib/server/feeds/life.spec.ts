import { eq } from 'drizzle-orm';
import ICAL from 'ical.js';
import { beforeEach, describe, expect, it } from 'vitest';
import { useDatabase } from '../../../../tests/support/database';
import { addTimetable, head, now } from '../../../../tests/support/timetable';
import { capabilitiesOf } from '$lib/domain/people/capabilities';
import { book } from '../bookings/book';
import { write } from '../db';
import { classTypes, people, rooms } from '../db/schema';
import { addSlot } from '../slots/add';
import { bringBack } from '../slots/bring-back';
import { callOff } from '../slots/call-off';
import { changeSlot } from '../slots/change';
import { createFeed, type FeedKind } from './create';
import { readFeed } from './read';

const ada = { personId: 3, capabilities: capabilitiesOf(['member']) };
const minute = 60_000;
const draft = {
	classTypeId: 1,
	roomId: 1,
	coachIds: [1],
	startsOn: '2026-12-07',
	startTime: '18:40',
	lengthMin: 60
};

async function feedOf(kind: FeedKind, who: typeof ada) {
	const made = await createFeed(who, { kind, name: 'Phone', now });
	if (!made.ok) throw new Error(made.refused);
	return async (at: number) => {
		const asked = { token: made.token, address: '10.1.0.1', now: at };
		const feed = await readFeed(asked, { gymName: 'Ropewalk', origin: 'https://gym.test' });
		if (!feed || feed === 'too-many') throw new Error('no feed');
		return new ICAL.Component(ICAL.parse(feed.body)).getAllSubcomponents('vevent');
	};
}

/** What a reader of calendars decides by: which entry, its revision, its time and its standing. */
const facts = (entry: ICAL.Component) => ({
	uid: String(entry.getFirstPropertyValue('uid')),
	sequence: Number(entry.getFirstPropertyValue('sequence')),
	stamp: String(entry.getFirstPropertyValue('dtstamp')),
	starts: String(entry.getFirstPropertyValue('dtstart')),
	status: String(entry.getFirstPropertyValue('status'))
});

describe('a class in a member’s calendar', () => {
	useDatabase();
	beforeEach(addTimetable);

	async function aClass() {
		const slot = await addSlot(head, { ...draft, kind: 'class' }, { now });
		if (!slot.ok) throw new Error(slot.refused);
		return slot.slotId;
	}

	/** Does what wants a look first: looks, then confirms. */
	async function confirmed(act: (seen?: string) => Promise<{ ok: boolean; sight?: object }>) {
		const look = await act();
		const done = look.ok ? look : await act((look.sight as { seen: string }).seen);
		expect(done).toMatchObject({ ok: true });
	}

	it('is one entry all its life: one UID, SEQUENCE up each time, never twice (RFC 5545 §3.8.4.7, §3.8.7.4)', async () => {
		const read = await feedOf('member', ada);
		const id = await aClass();
		let at = now;
		const later = () => (at += minute);
		const callItOff = () => {
			later();
			return confirmed((seen) => callOff(head, id, { why: 'The coach is ill', seen, now: at }));
		};
		const steps: (() => Promise<unknown>)[] = [
			() => book(ada, id, { now: later() }),
			() => {
				const moved = { ...draft, startTime: '19:10' };
				const asked = { sequence: 0, why: '', now: later() };
				return confirmed((seen) => changeSlot(head, id, moved, { ...asked, seen }));
			},
			callItOff,
			async () => {
				await bringBack(head, id, { now: later() });
				await book(ada, id, { now: later() });
			},
			callItOff
		];
		const lives = [];
		for (const step of steps) {
			await step();
			const entries = (await read(at)).map(facts);
			expect(entries).toHaveLength(1);
			lives.push(entries[0]!);
		}
		expect(lives.map(({ sequence, status }) => [sequence, status])).toEqual([
			[0, 'CONFIRMED'],
			[1, 'CONFIRMED'],
			[2, 'CANCELLED'],
			[3, 'CONFIRMED'],
			[4, 'CANCELLED']
		]);
		expect(new Set(lives.map(({ uid }) => uid)).size).toBe(1);
		const stamps = lives.map(({ stamp }) => stamp);
		expect([...new Set(stamps)].sort()).toEqual(stamps);
		expect(lives.map(({ starts }) => starts)).toEqual([
			'2026-12-07T18:40:00Z',
			...Array.from({ length: 4 }, () => '2026-12-07T19:10:00Z')
		]);
	});

	it('names no rule, no exception and no person: each class is an entry of its own (§3.8.4.4, §3.8.5)', async () => {
		const read = await feedOf('member', ada);
		await book(ada, await aClass(), { now });
		const [entry] = await read(now);
		for (const name of ['rrule', 'rdate', 'exdate', 'recurrence-id', 'organizer', 'attendee']) {
			expect([name, entry!.getAllProperties(name)]).toEqual([name, []]);
		}
		const { uid } = facts(entry!);
		expect(Buffer.byteLength(uid)).toBeLessThanOrEqual(255);
		expect(uid).toMatch(/^[0-9a-f-]{36}@gym\.test$/);
	});

	it.each([
		['the end of its entry', 'Row\r\nEND:VEVENT\r\nBEGIN:VEVENT\r\nUID:stolen'],
		['every mark that is escaped', 'a;b,c\\d\\n"e":f'],
		['emoji, and a word of 500 letters', `${'🏋️'.repeat(60)} ${'x'.repeat(500)}`],
		['control characters', 'tab\tbell\u0007one\u0001 line\u2028paragraph\u2029']
	])('reads back as it is stored where class, room and coach are called %s', async (_, words) => {
		await write(async (tx) => {
			await tx.update(classTypes).set({ name: words });
			await tx.update(rooms).set({ name: words }).where(eq(rooms.id, draft.roomId));
			await tx.update(people).set({ name: words });
		});
		const read = await feedOf('member', ada);
		await book(ada, await aClass(), { now });
		const entries = await read(now);
		expect(entries).toHaveLength(1);
		// Control characters become a space; nothing else changes (common practice, no source).
		const said = words.replace(/[\p{Cc}\u2028\u2029]+/gu, ' ').trim();
		expect(entries[0]!.getFirstPropertyValue('summary')).toBe(said);
		expect(entries[0]!.getFirstPropertyValue('location')).toBe(said);
		expect(entries[0]!.getFirstPropertyValue('description')).toContain(said);
	});
});
