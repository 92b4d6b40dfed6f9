import { and, asc, eq } from 'drizzle-orm';
import { beforeEach, describe, expect, it } from 'vitest';
import { useDatabase } from '../../../../tests/support/database';
import {
	addTimetable,
	bookInto,
	head,
	mondaysAndWednesdays as draft,
	now,
	rowCounts
} from '../../../../tests/support/timetable';
import { db, write } from '../db';
import { bookings, clashOverrides, outboxMessages, series, slots } from '../db/schema';
import { changeSlot } from '../slots/change';
import { extendHorizon } from '../slots/extend-horizon';
import { addSeries } from './add';
import { editSeries } from './edit';
import { endSeries } from './end';

useDatabase();
beforeEach(addTimetable);

const at = (iso: string) => Date.parse(iso);
const slotsOf = (seriesId: number) =>
	db.select().from(slots).where(eq(slots.seriesId, seriesId)).orderBy(asc(slots.startsAt));
const started = async (over: Partial<typeof draft> = {}) => {
	const made = await addSeries(head, { ...draft, ...over }, { now });
	if (!made.ok) throw new Error(made.refused);
	return made.seriesId;
};
const edit = (seriesId: number, over: Partial<typeof draft>, more: object = {}) =>
	editSeries(
		head,
		seriesId,
		{ ...draft, ...over },
		{ scope: 'all', includeChanged: false, version: 1, now, ...more }
	);
/** Looks, then confirms exactly what was shown. */
async function confirmed(ask: (more: object) => ReturnType<typeof editSeries>) {
	const look = await ask({});
	if (look.ok || !('sight' in look)) throw new Error('nothing to look at');
	return { look, done: await ask({ seen: look.sight.seen }) };
}

describe('starting a series', () => {
	it('makes its slots for 26 weeks, at the same wall-clock time over the clock change', async () => {
		const made = await slotsOf(await started());
		expect(made).toHaveLength(51);
		expect(made.at(-1)!.startsOn).toBe('2027-05-31');
		// Dublin: UTC+0 in winter, UTC+1 from 28 March 2027 (IANA tz database, from memory)
		const march = made.filter((s) => ['2027-03-24', '2027-03-29'].includes(s.startsOn));
		expect(march.map((s) => s.startsAt)).toEqual([
			at('2027-03-24T18:40:00Z'),
			at('2027-03-29T17:40:00Z')
		]);
		expect(new Set(made.map((s) => s.endsAt - s.startsAt))).toEqual(new Set([3_600_000]));
	});

	it('is the same when the horizon is extended twice, and goes on with the days', async () => {
		const id = await started();
		const before = await slotsOf(id);
		expect(await extendHorizon({ now })).toEqual({ made: 0, leftOut: 0 });
		expect(await slotsOf(id)).toEqual(before);
		const nextWeek = now + 7 * 86_400_000;
		expect(await extendHorizon({ now: nextWeek })).toEqual({ made: 2, leftOut: 0 });
		expect(await extendHorizon({ now: nextWeek })).toEqual({ made: 0, leftOut: 0 });
	});

	it.each([
		['ends-before-start', { ends: 'until', untilOn: '2026-12-06' }],
		['rule-unreadable', { repeats: 'typed', typedRule: 'FREQ=SECONDLY;COUNT=1000000000' }],
		['no-days', { days: [] }],
		['starts-in-the-past', { startsOn: '2026-11-30' }],
		['no-dates', { ends: 'until', untilOn: '2026-12-08', days: ['SA'] }],
		['unknown-room', { roomId: 99 }],
		['unknown-class-type', { classTypeId: 99 }],
		['unknown-coach', { coachIds: [3] }]
	] as const)('is refused as %s, and leaves every row as it was', async (code, over) => {
		const before = await rowCounts();
		const refused = await addSeries(head, { ...draft, ...over } as typeof draft, { now });
		expect(refused).toMatchObject({ ok: false, refused: code });
		expect(await rowCounts()).toEqual(before);
	});

	it('is refused where the room is taken, unless a reason is recorded, which later dates go by', async () => {
		const first = await started();
		const before = await rowCounts();
		const clashing = { ...draft, startTime: '19:00', coachIds: [2] };
		const refused = await addSeries(head, clashing, { now });
		expect(refused).toMatchObject({ ok: false, refused: 'room-overlap' });
		expect(await rowCounts()).toEqual(before);
		if (refused.ok || !('sight' in refused)) throw new Error('no sight');
		const { seen } = refused.sight;
		expect(await addSeries(head, clashing, { now, seen })).toMatchObject({
			refused: 'room-overlap'
		});
		const why = 'Half the floor each';
		expect(await addSeries(head, clashing, { now, seen, overrideWhy: why })).toMatchObject({
			ok: true
		});
		expect(await db.$count(clashOverrides, eq(clashOverrides.why, why))).toBe(51);
		expect(await extendHorizon({ now: now + 7 * 86_400_000 })).toEqual({ made: 4, leftOut: 0 });
		expect(await slotsOf(first)).toHaveLength(53);
	});

	it('is refused where the coach is in another class', async () => {
		await started();
		expect(await addSeries(head, { ...draft, roomId: 2 }, { now })).toMatchObject({
			refused: 'coach-overlap',
			detail: { name: 'Niamh Corrigan', title: 'Strength' }
		});
	});
});

describe('editing a series', () => {
	it('moves every slot ahead and leaves those that ran and those changed by hand', async () => {
		const id = await started({ startsOn: '2026-12-02', days: ['WE'] });
		const later = at('2026-12-05T10:00:00Z');
		const [ran, next, byHand] = await slotsOf(id);
		await changeSlot(
			head,
			byHand!.id,
			{ ...draft, startsOn: '2026-12-17', startTime: '07:00' },
			{ sequence: 0, why: '', now: later }
		);
		const done = await edit(id, { days: ['WE'], startTime: '19:30' }, { now: later });
		expect(done).toMatchObject({ ok: true, seriesId: id });
		const after = await slotsOf(id);
		expect(after[0]).toEqual(ran);
		expect(after[1]).toMatchObject({
			id: next!.id,
			uid: next!.uid,
			startTime: '19:30',
			recurrenceKey: '2026-12-09T19:30',
			sequence: 1,
			modifiedAt: later
		});
		expect(after[2]).toMatchObject({
			id: byHand!.id,
			startsOn: '2026-12-17',
			startTime: '07:00',
			recurrenceKey: '2026-12-16T19:30'
		});
		expect(await extendHorizon({ now: later })).toEqual({ made: 0, leftOut: 0 });
		const chosen = { now: later, version: 2, includeChanged: true };
		await edit(id, { days: ['WE'], startTime: '20:00' }, chosen);
		expect((await slotsOf(id))[2]).toMatchObject({ startsOn: '2026-12-16', startTime: '20:00' });
	});

	it('splits at a day: the old series ends before it, the new one goes on with the same slots', async () => {
		const id = await started();
		const before = await slotsOf(id);
		const done = await edit(id, { startsOn: '2026-12-16', roomId: 2 }, { scope: 'following' });
		if (!done.ok) throw new Error(done.refused);
		expect(done.seriesId).not.toBe(id);
		const [old] = await db.select().from(series).where(eq(series.id, id));
		expect(old).toMatchObject({ rule: 'FREQ=WEEKLY;UNTIL=20261215;BYDAY=MO,WE', version: 2 });
		expect((await slotsOf(id)).map((s) => s.startsOn)).toEqual([
			'2026-12-07',
			'2026-12-09',
			'2026-12-14'
		]);
		const after = await slotsOf(done.seriesId);
		expect(after.map((s) => s.id)).toEqual(before.slice(3).map((s) => s.id));
		expect(new Set(after.map((s) => s.roomId))).toEqual(new Set([2]));
		expect(await extendHorizon({ now })).toEqual({ made: 0, leftOut: 0 });
	});

	it('shows who holds a place first, then gives places back and tells them', async () => {
		const id = await started();
		const [monday, wednesday] = await slotsOf(id);
		await bookInto(monday!.id, [3, 4]);
		await bookInto(wednesday!.id, [3]);
		const before = await rowCounts();
		const { look, done } = await confirmed((more) =>
			edit(id, { days: ['MO'], startTime: '19:00' }, more)
		);
		expect(look.refused).toBe('look-first');
		if (!('sight' in look)) throw new Error('no sight');
		expect(look.sight.affected.map((s) => [s.becomes.what, s.people.map((p) => p.name)])).toEqual([
			['changed', ['Ada Byrne', 'Ben Cole']],
			['called-off', ['Ada Byrne']]
		]);
		expect(done).toMatchObject({ ok: true });
		const after = await db.select().from(bookings).orderBy(asc(bookings.id));
		expect(after.map((b) => b.status)).toEqual(['booked', 'booked', 'released']);
		const mail = await db.select().from(outboxMessages).orderBy(asc(outboxMessages.id));
		expect(mail.map((letter) => letter.personId).sort()).toEqual([3, 3, 4]);
		expect(mail.some((letter) => letter.text.includes('19:00 to 20:00'))).toBe(true);
		expect((await rowCounts()).slots).toBe(before.slots);
	});

	it('is refused when somebody books between looking and confirming', async () => {
		const id = await started();
		const [monday] = await slotsOf(id);
		await bookInto(monday!.id, [3]);
		const look = await edit(id, { startTime: '19:00' });
		if (look.ok || !('sight' in look)) throw new Error('no sight');
		await bookInto(monday!.id, [4]);
		const before = await rowCounts();
		const late = await edit(id, { startTime: '19:00' }, { seen: look.sight.seen });
		expect(late).toMatchObject({ refused: 'changed-meanwhile' });
		expect(await rowCounts()).toEqual(before);
	});

	it('is refused to the second of two who edit at once', async () => {
		const id = await started();
		expect(await edit(id, { startTime: '19:00' })).toMatchObject({ ok: true });
		expect(await edit(id, { startTime: '20:00' })).toMatchObject({ refused: 'changed-meanwhile' });
	});

	it('makes a day anew that fell out and comes back', async () => {
		const id = await started();
		await edit(id, { days: ['MO'] });
		expect((await slotsOf(id)).every((s) => s.recurrenceKey!.endsWith('18:40'))).toBe(true);
		await edit(id, {}, { version: 2 });
		const standing = await db
			.select()
			.from(slots)
			.where(and(eq(slots.seriesId, id), eq(slots.startsOn, '2026-12-09')));
		expect(standing.map((s) => s.cancelledAt)).toEqual([null]);
	});
});

describe('ending a series', () => {
	it('calls off what comes after the day, and nothing is made again', async () => {
		const id = await started();
		const ended = await endSeries(head, id, { lastOn: '2026-12-14', why: 'The coach leaves', now });
		expect(ended).toMatchObject({ ok: true, calledOff: 48 });
		const standing = (await slotsOf(id)).filter((s) => s.cancelledAt === null);
		expect(standing.map((s) => s.startsOn)).toEqual(['2026-12-07', '2026-12-09', '2026-12-14']);
		expect(await extendHorizon({ now })).toEqual({ made: 0, leftOut: 0 });
	});

	it('is over by itself once its last date has passed', async () => {
		const id = await started({ ends: 'count', count: 2 });
		await extendHorizon({ now: at('2026-12-20T10:00:00Z') });
		const [over] = await db.select().from(series).where(eq(series.id, id));
		expect(over!.endedAt).toBe(at('2026-12-20T10:00:00Z'));
	});

	it('writes what was done into the audit log', async () => {
		const id = await started();
		await endSeries(head, id, { lastOn: '2026-12-14', why: 'The coach leaves', now });
		const verbs = await write((tx) => tx.query.auditEntries.findMany());
		expect(verbs.map((entry) => entry.verb)).toEqual(['series.add', 'series.end']);
	});
});
