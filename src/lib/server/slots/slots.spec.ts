import { asc, eq, sum } from 'drizzle-orm';
import { beforeEach, describe, expect, it } from 'vitest';
import { useDatabase } from '../../../../tests/support/database';
import {
	addSession,
	addTimetable,
	bookInto,
	head,
	mondaysAndWednesdays,
	now,
	rowCounts
} from '../../../../tests/support/timetable';
import { capabilitiesOf } from '$lib/domain/people/capabilities';
import { book } from '../bookings/book';
import { close } from '../closures/close';
import { endClosure } from '../closures/end';
import { db, write } from '../db';
import {
	bookings,
	clashOverrides,
	kitItems,
	ledgerEntries,
	outboxMessages,
	people,
	publications,
	sessionRevisions,
	slots,
	trainingSessions
} from '../db/schema';
import { grantPass } from '../passes/grant';
import { publishWeek } from '../publications/publish-week';
import { editRoom } from '../rooms/edit';
import { addSeries } from '../series/add';
import { editSeries } from '../series/edit';
import { addSlot } from './add';
import { bringBack } from './bring-back';
import { callOff } from './call-off';
import { changeSlot } from './change';
import { lay } from './lay';
import { shortagesAhead } from './shortages';

useDatabase();
beforeEach(addTimetable);

const draft = {
	classTypeId: 1,
	roomId: 1,
	coachIds: [1],
	startsOn: '2026-12-07',
	startTime: '18:40',
	lengthMin: 60
};
const made = async (over: Partial<typeof draft> & { setPlaces?: number } = {}) => {
	const slot = await addSlot(head, { ...draft, ...over, kind: 'class' }, { now });
	if (!slot.ok) throw new Error(slot.refused);
	return slot.slotId;
};
const slotOf = async (id: number) => (await db.select().from(slots).where(eq(slots.id, id)))[0]!;
const statuses = async () =>
	(await db.select().from(bookings).orderBy(asc(bookings.id))).map((b) => b.status);
const letters = () => db.select().from(outboxMessages).orderBy(asc(outboxMessages.id));
const seenOf = (refused: object) => (refused as { sight: { seen: string } }).sight.seen;
const afterItRan = Date.parse('2026-12-08T10:00:00Z');

describe('calling off a slot', () => {
	it('shows who counts on it first, then gives their places back and tells each once', async () => {
		const id = await made();
		await bookInto(id, [3, 4]);
		await bookInto(id, [5], 'waitlisted');
		const before = await rowCounts();
		const look = await callOff(head, id, { why: 'The coach is ill', now });
		expect(look).toMatchObject({ refused: 'look-first', sight: { affected: [{ slotId: id }] } });
		expect(await rowCounts()).toEqual(before);
		const done = await callOff(head, id, { why: 'The coach is ill', seen: seenOf(look), now });
		expect(done).toEqual({ ok: true, released: 3 });
		expect(await statuses()).toEqual(['released', 'released', 'released']);
		expect((await letters()).map((l) => l.personId)).toEqual([3, 4, 5]);
		expect((await letters())[0]!.text).toContain('The coach is ill');
		expect(await slotOf(id)).toMatchObject({ cancelledAt: now, sequence: 1 });
	});

	it('gives the credit of a pack back', async () => {
		const id = await made();
		const pack = { personId: 7, kind: 'pack' as const, name: 'Ten', perWeek: null, credits: 10 };
		await write((tx) => tx.insert(people).values({ id: 7, name: 'Eve Fox', createdAt: 1 }));
		const dates = { startsOn: '2026-11-01', endsOn: null, note: null };
		const granted = await grantPass(head, { ...pack, ...dates }, { now });
		if (!granted.ok) throw new Error(granted.refused);
		const eve = { personId: 7, capabilities: capabilitiesOf(['member']) };
		expect(await book(eve, id, { now })).toMatchObject({ booking: { status: 'booked' } });
		const balance = () =>
			db
				.select({ left: sum(ledgerEntries.amount) })
				.from(ledgerEntries)
				.where(eq(ledgerEntries.account, `pass:${granted.passId}`));
		expect(await balance()).toEqual([{ left: '9' }]);
		const look = await callOff(head, id, { why: 'The coach is ill', now });
		await callOff(head, id, { why: 'The coach is ill', seen: seenOf(look), now });
		expect(await balance()).toEqual([{ left: '10' }]);
	});

	it('is refused twice, and once the class has started', async () => {
		const id = await made();
		expect(await callOff(head, id, { why: 'ill', now: afterItRan })).toMatchObject({
			refused: 'already-ran'
		});
		await callOff(head, id, { why: 'ill', now });
		expect(await callOff(head, id, { why: 'ill', now })).toMatchObject({
			refused: 'slot-cancelled'
		});
	});

	it('can be taken back while the room is free', async () => {
		const id = await made();
		await callOff(head, id, { why: 'ill', now });
		expect(await bringBack(head, id, { now })).toEqual({ ok: true });
		expect(await slotOf(id)).toMatchObject({ cancelledAt: null, sequence: 2 });
		await callOff(head, id, { why: 'ill', now });
		await made({ coachIds: [2] });
		expect(await bringBack(head, id, { now })).toMatchObject({ refused: 'room-overlap' });
	});
});

describe('changing a slot', () => {
	const change = (id: number, over: object, more: object = {}) =>
		changeSlot(head, id, { ...draft, ...over }, { sequence: 0, why: '', now, ...more });

	it('tells the people in it where and when it is now', async () => {
		const id = await made();
		await bookInto(id, [3]);
		const look = await change(id, { startTime: '19:00', roomId: 2 });
		expect(look).toMatchObject({ refused: 'look-first' });
		expect(await change(id, { startTime: '19:00', roomId: 2 }, { seen: seenOf(look) })).toEqual({
			ok: true
		});
		expect((await letters())[0]!.text).toMatch(/19:00 to 20:00.*Loft/);
		expect(await statuses()).toEqual(['booked']);
		expect(await slotOf(id)).toMatchObject({ startTime: '19:00', changedAt: now, sequence: 1 });
	});

	it('shows who is in another class at the new time', async () => {
		const [id, other] = [
			await made(),
			await made({ startTime: '20:00', roomId: 2, coachIds: [2] })
		];
		await bookInto(id, [3, 4]);
		await bookInto(other, [3]);
		expect(await change(id, { startTime: '20:30' })).toMatchObject({
			sight: { affected: [{ people: [{ elsewhere: 'Strength' }, { elsewhere: null }] }] }
		});
	});

	it('drops nobody when places are lowered, and says who is over', async () => {
		const id = await made();
		await bookInto(id, [3, 4]);
		const look = await change(id, { setPlaces: 1 });
		expect(look).toMatchObject({
			sight: { affected: [{ becomes: { what: 'fewer-places', places: 1 } }] }
		});
		expect(await change(id, { setPlaces: 1 }, { seen: seenOf(look) })).toEqual({ ok: true });
		expect(await statuses()).toEqual(['booked', 'booked']);
	});

	it('gives a place that opens to the first who waits', async () => {
		const id = await made({ setPlaces: 1 });
		await bookInto(id, [3]);
		await bookInto(id, [4, 5], 'waitlisted');
		expect(await change(id, { setPlaces: 2 })).toEqual({ ok: true });
		expect(await statuses()).toEqual(['booked', 'booked', 'waitlisted']);
	});

	it('is refused to the second of two who change it at once', async () => {
		const id = await made();
		await change(id, { startTime: '19:00' });
		expect(await change(id, { startTime: '20:00' })).toMatchObject({
			refused: 'changed-meanwhile'
		});
	});

	it('onto a room or coach that is taken wants a reason, which is recorded', async () => {
		await made();
		const id = await made({ startTime: '20:00' });
		const look = await change(id, { startTime: '19:00' });
		expect(look).toMatchObject({ refused: 'room-overlap', detail: { name: 'Long Floor' } });
		const seen = seenOf(look);
		expect(await change(id, { startTime: '19:00' }, { seen })).toMatchObject({
			refused: 'room-overlap'
		});
		const overrideWhy = 'Two small groups';
		expect(await change(id, { startTime: '19:00' }, { seen, overrideWhy })).toEqual({ ok: true });
		const recorded = await db.select().from(clashOverrides).orderBy(asc(clashOverrides.kind));
		expect(recorded.map((o) => [o.kind, o.why, o.byId])).toEqual([
			['coach', overrideWhy, 1],
			['room', overrideWhy, 1]
		]);
	});

	it('is refused where people who hold a place would lose their kit', async () => {
		const rowing = await addSession('Row');
		const [id, other] = [await made(), await made({ startTime: '20:00', coachIds: [2] })];
		await lay(head, { slots: [id, other], session: rowing }, { now });
		await bookInto(id, [3, 4]);
		await bookInto(other, [5]);
		const before = await rowCounts();
		const moved = { startTime: '18:50', roomId: 2, coachIds: [2] };
		const refused = await changeSlot(
			head,
			other,
			{ ...draft, ...moved },
			{ sequence: 0, why: '', now }
		);
		expect(refused).toEqual({
			ok: false,
			refused: 'kit-short',
			detail: { item: 'rowers', short: 1 }
		});
		expect(await rowCounts()).toEqual(before);
	});
});

describe('closing days', () => {
	const series = () => addSeries(head, mondaysAndWednesdays, { now });
	const days = { fromOn: '2026-12-07', toOn: '2026-12-09', why: 'Floor repairs' };

	it('shows who is affected, calls the slots off, and keeps new ones away', async () => {
		await series();
		const [first] = await db.select().from(slots).orderBy(asc(slots.startsAt));
		await bookInto(first!.id, [3]);
		const look = await close(head, days, { now });
		expect(look).toMatchObject({ refused: 'look-first', sight: { affected: [{ people: [{}] }] } });
		const done = await close(head, days, { now, seen: seenOf(look) });
		expect(done).toMatchObject({ ok: true, calledOff: 2 });
		expect(await statuses()).toEqual(['released']);
		expect(await letters()).toHaveLength(1);
		const added = await addSlot(head, { ...draft, roomId: 2, kind: 'class' }, { now });
		expect(added).toMatchObject({ refused: 'closed-day' });
	});

	it('of one room leaves the other open', async () => {
		await series();
		const other = await made({ roomId: 2, coachIds: [2] });
		await close(head, { ...days, roomId: 1 }, { now });
		expect(await slotOf(other)).toMatchObject({ cancelledAt: null });
	});

	it('leaves off what the timetable does not mean any more when they open again', async () => {
		const made1 = await series();
		if (!made1.ok) throw new Error(made1.refused);
		const shut = await close(head, days, { now });
		if (!shut.ok) throw new Error(shut.refused);
		const edited = await editSeries(
			head,
			made1.seriesId,
			{ ...mondaysAndWednesdays, startTime: '19:30' },
			{ scope: 'all', includeChanged: false, version: 1, now: now + 1000 }
		);
		expect(edited).toMatchObject({ ok: true });
		expect(await endClosure(head, shut.closureId, { now: now + 2000 })).toMatchObject({
			broughtBack: 0,
			made: 2,
			leftOut: 0
		});
		const standing = (await db.select().from(slots)).filter((s) => s.cancelledAt === null);
		expect(new Set(standing.map((s) => s.startTime))).toEqual(new Set(['19:30']));
		expect(standing).toHaveLength(51);
	});

	it('brings back what it called off and makes what was never made, once ended', async () => {
		await close(head, days, { now });
		await series();
		expect(await db.$count(slots)).toBe(49);
		const more = { fromOn: '2026-12-14', toOn: '2026-12-14', why: 'Gas works' };
		const second = await close(head, more, { now: now + 1000 });
		if (!second.ok) throw new Error(second.refused);
		expect(await endClosure(head, second.closureId, { now: now + 2000 })).toEqual({
			ok: true,
			broughtBack: 1,
			made: 0,
			leftOut: 0
		});
		expect(await endClosure(head, 1, { now: now + 2000 })).toEqual({
			ok: true,
			broughtBack: 0,
			made: 2,
			leftOut: 0
		});
		expect(await endClosure(head, 1, { now })).toMatchObject({ refused: 'closure-ended' });
		const standing = await db.select().from(slots);
		expect(standing.filter((s) => s.cancelledAt === null)).toHaveLength(51);
	});
});

describe('laying and publishing', () => {
	it('lays the current revision on several slots, takes it off again, and publishes the week', async () => {
		const rowing = await addSession('Row', { variationId: 2 });
		const [one, two] = [await made(), await made({ startsOn: '2026-12-09' })];
		expect(await publishWeek(head, '2026-12-07', { now })).toMatchObject({
			refused: 'nothing-to-publish'
		});
		expect(await lay(head, { slots: [one, two], session: rowing }, { now })).toEqual({
			ok: true,
			slots: 2,
			told: 0
		});
		expect(await publishWeek(head, '2026-12-07', { now })).toEqual({ ok: true, slots: 2 });
		expect(await slotOf(one)).toMatchObject({ sessionPublishedAt: now, laidAt: now });
		expect(await lay(head, { slots: [one] }, { now })).toMatchObject({ ok: true });
		expect(await slotOf(one)).toMatchObject({
			sessionRevisionId: null,
			sessionPublishedAt: null
		});
		await lay(head, { slots: [one], session: rowing }, { now });
		expect(await publishWeek(head, '2026-12-07', { now })).toEqual({ ok: true, slots: 1 });
		const shown = await db.select().from(publications).orderBy(asc(publications.id));
		expect(shown.map((p) => [p.slots, p.isRepeat])).toEqual([
			[2, false],
			[1, true]
		]);
	});

	it('is refused on a slot that ran, and on one that was called off', async () => {
		const rowing = await addSession('Row');
		const id = await made();
		const before = await rowCounts();
		expect(await lay(head, { slots: [id], session: rowing }, { now: afterItRan })).toMatchObject({
			refused: 'already-ran'
		});
		expect(await rowCounts()).toEqual(before);
		await callOff(head, id, { why: 'ill', now });
		expect(await lay(head, { slots: [id], session: rowing }, { now })).toMatchObject({
			refused: 'slot-cancelled'
		});
	});

	it('keeps choices that still exist; the rest fall to as written, and those people are told', async () => {
		const [first, second] = [
			await addSession('Row'),
			await addSession('Row on', { prescriptionId: 'other' })
		];
		const id = await made();
		await lay(head, { slots: [id], session: first }, { now });
		await bookInto(id, [3, 4]);
		await write((tx) =>
			tx
				.update(bookings)
				.set({ variations: { row: 2 } })
				.where(eq(bookings.personId, 3))
		);
		expect(await lay(head, { slots: [id], session: first }, { now })).toMatchObject({
			ok: true,
			told: 0
		});
		const look = await lay(head, { slots: [id], session: second }, { now });
		expect(look).toMatchObject({
			refused: 'look-first',
			sight: { affected: [{ people: [{ personId: 3 }] }] }
		});
		const done = await lay(head, { slots: [id], session: second, seen: seenOf(look) }, { now });
		expect(done).toEqual({ ok: true, slots: 1, told: 1 });
		expect((await letters()).map((l) => l.personId)).toEqual([3]);
		const [kept] = await db.select().from(bookings).where(eq(bookings.personId, 3));
		expect(kept!.variations).toEqual({});
	});

	it('is refused when a new revision is saved between looking and confirming', async () => {
		const [first, second] = [
			await addSession('Row'),
			await addSession('Row on', { prescriptionId: 'other' })
		];
		const id = await made();
		await lay(head, { slots: [id], session: first }, { now });
		await bookInto(id, [3]);
		await write((tx) => tx.update(bookings).set({ variations: { row: 2 } }));
		const look = await lay(head, { slots: [id], session: second }, { now });
		await write(async (tx) => {
			const [now1] = await tx
				.select()
				.from(sessionRevisions)
				.where(eq(sessionRevisions.trainingSessionId, second));
			const { content, trainingSessionId } = now1!;
			await tx
				.insert(sessionRevisions)
				.values({ content, trainingSessionId, number: 2, createdAt: now });
			await tx
				.update(trainingSessions)
				.set({ revisionNumber: 2 })
				.where(eq(trainingSessions.id, second));
		});
		const late = await lay(head, { slots: [id], session: second, seen: seenOf(look) }, { now });
		expect(late).toMatchObject({ refused: 'changed-meanwhile' });
	});

	it('is refused where it would take kit from people who hold a place', async () => {
		const rowing = await addSession('Row');
		const id = await made();
		await bookInto(id, [3, 4, 5]);
		const before = await rowCounts();
		expect(await lay(head, { slots: [id], session: rowing }, { now })).toEqual({
			ok: false,
			refused: 'kit-short',
			detail: { item: 'rowers', short: 1 }
		});
		expect(await rowCounts()).toEqual(before);
	});
});

describe('shortages ahead', () => {
	const week = {
		fromAt: Date.parse('2026-12-07T00:00:00Z'),
		toAt: Date.parse('2026-12-14T00:00:00Z')
	};

	it('name the piece, by how many and when, at the places planned, with what the kit takes', async () => {
		const rowing = await addSession('Row');
		const id = await made({ setPlaces: 5 });
		await lay(head, { slots: [id], session: rowing }, { now });
		// Two rowers for five people, for the 20 minutes of the block: three short.
		expect(await shortagesAhead(week)).toEqual([
			{
				kitGroupId: 1,
				item: 'rowers',
				interval: null,
				roomId: null,
				fromAt: Date.parse('2026-12-07T18:40:00Z'),
				toAt: Date.parse('2026-12-07T19:00:00Z'),
				claimed: 5,
				inService: 2,
				short: 3,
				isForBooked: false,
				blocks: [{ slotId: id, blockId: 'b1', kitTakes: 2, planned: 5 }]
			}
		]);
	});

	it('say so when people who hold a place are short, as kit falls out', async () => {
		const rowing = await addSession('Row');
		const id = await made({ setPlaces: 2 });
		await lay(head, { slots: [id], session: rowing }, { now });
		expect(await shortagesAhead(week)).toEqual([]);
		await bookInto(id, [3, 4]);
		await write((tx) => tx.update(kitItems).set({ count: 1 }));
		expect(await shortagesAhead(week)).toMatchObject([{ short: 1, isForBooked: true }]);
	});
});

describe('a room', () => {
	it('with a higher limit gives its new places to those who wait', async () => {
		await editRoom(head, 1, { name: 'Long Floor', places: 2 }, { now });
		const id = await made();
		await bookInto(id, [3]);
		await bookInto(id, [4], 'waitlisted');
		await editRoom(head, 1, { name: 'Long Floor', places: 3 }, { now });
		expect(await statuses()).toEqual(['booked', 'booked']);
	});
});
