import { eq, sql } from 'drizzle-orm';
import { describe, expect, it } from 'vitest';
import { book } from '../../src/lib/server/bookings/book';
import { cancel } from '../../src/lib/server/bookings/cancel';
import { choose } from '../../src/lib/server/bookings/choose';
import { giveToWaiting } from '../../src/lib/server/bookings/give';
import { walkIn } from '../../src/lib/server/bookings/walk-in';
import { db, write } from '../../src/lib/server/db';
import {
	auditEntries,
	bookingChanges,
	bookings,
	ledgerEntries,
	outboxMessages,
	slots
} from '../../src/lib/server/db/schema';
import { passesOf } from '../../src/lib/server/passes/queries';
import { closeRoll } from '../../src/lib/server/roll/close';
import { markRoll } from '../../src/lib/server/roll/mark';
import { rollOf } from '../../src/lib/server/roll/queries';
import { slotById } from '../../src/lib/server/slots/queries';
import { useDatabase } from '../support/database';
import { acting, addMembers, addSlot, addSpecGym, specNow } from '../support/gym';

const now = specNow;
const hour = 3_600_000;
/** All twenty rounds of G1 by `FULL=1`; a short form otherwise. */
const rounds = process.env.FULL ? 20 : 1;

async function counts() {
	const of = async (
		table: typeof bookings | typeof bookingChanges | typeof ledgerEntries | typeof auditEntries
	) => (await db.select({ n: sql<number>`count(*)` }).from(table))[0]!.n;
	return [
		await of(bookings),
		await of(bookingChanges),
		await of(ledgerEntries),
		await of(auditEntries)
	];
}
const statusOf = async (id: number) =>
	(await db.select().from(bookings).where(eq(bookings.id, id)).get())!.status;

describe('booking a place', () => {
	useDatabase();

	it('takes a place while room, coach and kit allow, and a turn on the waitlist after that', async () => {
		const gym = await addSpecGym();
		const slot = await addSlot(gym, { setPlaces: 3 });
		const members = await addMembers(5);
		const answers = [];
		for (const id of members) answers.push(await book(acting(id), slot, { now }));
		expect(answers.map((a) => (a.ok ? [a.booking.status, a.booking.position] : a))).toEqual([
			['booked', undefined],
			['booked', undefined],
			['booked', undefined],
			['waitlisted', 1],
			['waitlisted', 2]
		]);
		expect((await slotById(slot))!.places).toMatchObject({
			limit: 3,
			limitedBy: 'set',
			free: 0,
			waitlisted: 2
		});
	});

	it('counts the coach in the room’s posted limit', async () => {
		const gym = await addSpecGym({ barPlaces: 30 });
		const slot = await addSlot(gym, { roomId: gym.loftId });
		expect((await slotById(slot))!.places).toMatchObject({ limit: 9, limitedBy: 'room' });
	});

	it('offers the next rung when the kit is short as chosen, and forces nobody', async () => {
		const gym = await addSpecGym({ barPlaces: 1, rings: 1 });
		const slot = await addSlot(gym);
		const [a, b, c] = await addMembers(3);
		await book(acting(a!), slot, { now });
		const second = await book(acting(b!), slot, { now });
		expect(second).toMatchObject({
			ok: true,
			booking: { status: 'waitlisted', position: 1 },
			offer: { [gym.prescriptionId]: gym.ringRowId }
		});
		const third = await book(acting(c!), slot, {
			now,
			variations: { [gym.prescriptionId]: gym.ringRowId }
		});
		expect(third).toMatchObject({ booking: { status: 'booked' } });
		const id = second.ok ? second.booking.id : 0;
		const floor = { [gym.prescriptionId]: gym.floorId };
		expect(await choose(acting(b!), id, { now, variations: floor })).toMatchObject({
			booking: { status: 'booked' }
		});
		expect((await passesOf(b!)).length).toBe(1);
	});

	it('counts the kit of the class next door at the same minute', async () => {
		const gym = await addSpecGym({ barPlaces: 2, rings: 0 });
		const [a, b, c] = await addMembers(3);
		const long = await addSlot(gym);
		const loft = await addSlot(gym, { roomId: gym.loftId, coachId: null });
		await book(acting(a!), long, { now });
		await book(acting(b!), long, { now });
		expect(await book(acting(c!), loft, { now })).toMatchObject({
			booking: { status: 'waitlisted' }
		});
	});

	it.each([
		[
			'a class that was called off',
			'cancelled',
			async (slot: number) => {
				await write((tx) => tx.update(slots).set({ cancelledAt: 1 }).where(eq(slots.id, slot)));
				return now;
			}
		],
		['a class that has started', 'past', async () => now + 48 * hour],
		['a class too far ahead', 'not-open-yet', async () => now - 60 * 24 * hour]
	] as const)('refuses %s and writes nothing', async (_case, refused, prepare) => {
		const gym = await addSpecGym();
		const slot = await addSlot(gym);
		const [a] = await addMembers(1);
		const at = await prepare(slot);
		const before = await counts();
		expect(await book(acting(a!), slot, { now: at })).toMatchObject({ ok: false, refused });
		expect(await counts()).toEqual(before);
	});

	it('refuses a second booking, an overlapping one, a made-up choice and a drop-in; touching is fine', async () => {
		const gym = await addSpecGym();
		const slot = await addSlot(gym);
		const overlapping = await addSlot(gym, { time: '19:00', roomId: gym.loftId, coachId: null });
		const touching = await addSlot(gym, { time: '19:40' });
		const [a, b] = await addMembers(2);
		await book(acting(a!), slot, { now });
		const before = await counts();
		expect(await book(acting(a!), slot, { now })).toMatchObject({ refused: 'already-booked' });
		expect(await book(acting(a!), overlapping, { now })).toMatchObject({ refused: 'overlapping' });
		expect(await book(acting(b!), slot, { now, variations: { nope: 1 } })).toMatchObject({
			refused: 'unknown-choice'
		});
		expect(await book(acting(b!), slot, { now, payment: 'drop-in' })).toMatchObject({
			refused: 'payment-unavailable'
		});
		expect(await book(acting(b!), slot, { now, memberId: a! })).toMatchObject({
			refused: 'not-allowed'
		});
		expect(await book(acting(b!), 9_999, { now })).toMatchObject({ refused: 'not-found' });
		expect(await counts()).toEqual(before);
		expect(await book(acting(a!), touching, { now })).toMatchObject({ ok: true });
	});

	it('uses one credit of a pack, and refuses when none is left', async () => {
		const gym = await addSpecGym();
		const [a] = await addMembers(1, 1);
		await book(acting(a!), await addSlot(gym), { now });
		expect((await passesOf(a!))[0]!.balance).toBe(0);
		const next = await addSlot(gym, { on: '2026-12-03' });
		expect(await book(acting(a!), next, { now })).toMatchObject({ refused: 'no-pass' });
	});

	it('lets 500 people ask for 12 places at once, again and again: 12 in, the rest waiting in order (G1)', async () => {
		const gym = await addSpecGym({ barPlaces: 40 });
		const members = await addMembers(500);
		for (let round = 0; round < rounds; round += 1) {
			const slot = await addSlot(gym, {
				on: `2026-12-${String(3 + round).padStart(2, '0')}`,
				setPlaces: 12
			});
			const answers = await Promise.all(members.map((id) => book(acting(id), slot, { now })));
			const got = answers.map((a) => (a.ok ? a.booking : null));
			expect(got.filter((b) => b?.status === 'booked')).toHaveLength(12);
			expect(got.slice(0, 12).every((b) => b?.status === 'booked')).toBe(true);
			expect(got.slice(12).map((b) => b?.position)).toEqual(
				Array.from({ length: 488 }, (_, i) => i + 1)
			);
		}
	}, 300_000);
});

describe('giving a place up', () => {
	useDatabase();

	it.each([
		['in time', -1, 'cancelled', 1],
		['at the cut-off itself', 0, 'cancelled', 1],
		['a millisecond late', 1, 'late-cancelled', 0]
	])('%s', async (_case, past, status, balance) => {
		const gym = await addSpecGym();
		const slot = await addSlot(gym);
		const [a] = await addMembers(1, 1);
		const booked = await book(acting(a!), slot, { now });
		const cutOff = (await slotById(slot))!.startsAt - 2 * hour;
		const id = booked.ok ? booked.booking.id : 0;
		expect(await cancel(acting(a!), id, { now: cutOff + past })).toMatchObject({
			booking: { status }
		});
		expect((await passesOf(a!))[0]!.balance).toBe(balance);
		expect(await cancel(acting(a!), id, { now: cutOff + past })).toMatchObject({
			refused: 'not-live'
		});
	});

	it('gives the place to the first on the waitlist, once, and tells them', async () => {
		const gym = await addSpecGym();
		const slot = await addSlot(gym, { setPlaces: 1 });
		const [a, b, c] = await addMembers(3, 2);
		const first = await book(acting(a!), slot, { now });
		await book(acting(b!), slot, { now });
		await book(acting(c!), slot, { now });
		expect((await passesOf(b!))[0]!.balance).toBe(2);
		const given = await cancel(acting(a!), first.ok ? first.booking.id : 0, { now });
		expect(given).toMatchObject({ promoted: [{ personId: b }], creditGivenBack: true });
		expect((await passesOf(b!))[0]!.balance).toBe(1);
		expect((await passesOf(c!))[0]!.balance).toBe(2);
		const mail = await db.select().from(outboxMessages);
		expect(mail.map((message) => [message.personId, message.kind])).toEqual([
			[b, 'booking-promoted']
		]);
	});

	it('keeps the turn of whoever the kit cannot serve, and asks the next', async () => {
		const gym = await addSpecGym({ barPlaces: 1, rings: 1 });
		const slot = await addSlot(gym);
		const [a, b, c, d] = await addMembers(4);
		const rings = { [gym.prescriptionId]: gym.ringRowId };
		await book(acting(a!), slot, { now });
		const ringed = await book(acting(b!), slot, { now, variations: rings });
		await book(acting(c!), slot, { now });
		await book(acting(d!), slot, { now, variations: rings });
		const freed = await cancel(acting(b!), ringed.ok ? ringed.booking.id : 0, { now });
		expect(freed).toMatchObject({
			promoted: [{ personId: d }],
			passedOver: [{ personId: c, why: 'kit' }]
		});
	});

	it('promotes nobody after the cut-off; the desk gives the place by hand', async () => {
		const gym = await addSpecGym();
		const slot = await addSlot(gym, { setPlaces: 1 });
		const [a, b] = await addMembers(2);
		const first = await book(acting(a!), slot, { now });
		const second = await book(acting(b!), slot, { now });
		const late = (await slotById(slot))!.startsAt - hour;
		expect(await cancel(acting(a!), first.ok ? first.booking.id : 0, { now: late })).toMatchObject({
			promoted: []
		});
		expect(await statusOf(second.ok ? second.booking.id : 0)).toBe('waitlisted');
		const desk = acting(gym.deskId, 'front_desk');
		expect(await giveToWaiting(desk, slot, { now: late })).toMatchObject({ ok: true });
		expect(await statusOf(second.ok ? second.booking.id : 0)).toBe('booked');
	});

	it('is not for other members to do, and the desk’s own doing is in the audit log', async () => {
		const gym = await addSpecGym();
		const slot = await addSlot(gym);
		const [a, b] = await addMembers(2);
		const booked = await book(acting(a!), slot, { now });
		const id = booked.ok ? booked.booking.id : 0;
		expect(await cancel(acting(b!), id, { now })).toMatchObject({ refused: 'not-found' });
		await cancel(acting(gym.deskId, 'front_desk'), id, { now });
		expect((await db.select().from(auditEntries)).map(({ verb }) => verb)).toEqual([
			'bookings.cancel'
		]);
	});
});

describe('the roll', () => {
	useDatabase();

	async function aClass() {
		const gym = await addSpecGym({ barPlaces: 8 });
		const slot = await addSlot(gym, { on: '2026-12-01', time: '12:30' });
		const members = await addMembers(3);
		const ids = [];
		for (const id of members) {
			const booked = await book(acting(id), slot, { now: now - hour });
			ids.push(booked.ok ? booked.booking.id : 0);
		}
		return { gym, slot, members, ids, desk: acting(gym.deskId, 'front_desk') };
	}

	it('marks who came, late or not, and undoes it', async () => {
		const { slot, ids, desk } = await aClass();
		const [a, b] = ids;
		await markRoll(
			desk,
			slot,
			[
				{ bookingId: a!, status: 'attended' },
				{ bookingId: b!, status: 'attended', late: true }
			],
			{ now }
		);
		expect((await rollOf(slot)).map((r) => [r.status, r.isLate])).toEqual([
			['attended', false],
			['attended', true],
			['booked', false]
		]);
		expect(
			await markRoll(desk, slot, [{ bookingId: a!, status: 'attended' }], { now: now + 1 })
		).toMatchObject({ changed: 0 });
		await markRoll(desk, slot, [{ bookingId: b!, status: 'booked' }], { now });
		expect(await statusOf(b!)).toBe('booked');
	});

	it('closes with who did not come', async () => {
		const { slot, ids, desk } = await aClass();
		await markRoll(desk, slot, [{ bookingId: ids[0]!, status: 'attended' }], { now });
		expect(await closeRoll(desk, slot, { now })).toMatchObject({ refused: 'not-started' });
		expect(await closeRoll(desk, slot, { now: now + hour })).toEqual({ ok: true, noShows: 2 });
	});

	it('is for the desk and for the coaches of the class alone, and all marks stand or none', async () => {
		const { gym, slot, ids } = await aClass();
		const mark = [{ bookingId: ids[0]!, status: 'attended' as const }];
		const other = acting(gym.deskId + 100, 'coach');
		expect(await markRoll(other, slot, mark, { now })).toMatchObject({ refused: 'not-found' });
		const coach = acting(gym.coachId, 'coach');
		const broken = [...mark, { bookingId: 9_999, status: 'attended' as const }];
		expect(await markRoll(coach, slot, broken, { now })).toMatchObject({ refused: 'not-found' });
		expect(await statusOf(ids[0]!)).toBe('booked');
		expect(await markRoll(coach, slot, mark, { now })).toMatchObject({ changed: 1 });
	});

	it('lets a walk-in in, checked in, but never silently past those who wait', async () => {
		const { slot, desk } = await aClass();
		const [walker, waiter] = await addMembers(2);
		await write((tx) => tx.update(slots).set({ setPlaces: 4 }).where(eq(slots.id, slot)));
		expect(await walkIn(desk, slot, { personId: walker!, now })).toMatchObject({ ok: true });
		expect(await walkIn(desk, slot, { personId: waiter!, now })).toMatchObject({ refused: 'full' });
		await book(acting(waiter!), slot, { now });
		await write((tx) => tx.update(slots).set({ setPlaces: 5 }).where(eq(slots.id, slot)));
		const [third] = await addMembers(1);
		expect(await walkIn(desk, slot, { personId: third!, now })).toMatchObject({
			refused: 'waitlist-first'
		});
		const reason = 'Waited at the door, the other said no by phone';
		expect(await walkIn(desk, slot, { personId: third!, now, passOver: reason })).toMatchObject({
			ok: true
		});
	});
});

describe('the ledger', () => {
	useDatabase();

	it('sums to zero, and a pack’s balance is the sum of its account', async () => {
		const gym = await addSpecGym();
		const members = await addMembers(4, 3);
		for (const [i, on] of ['2026-12-03', '2026-12-04', '2026-12-05'].entries()) {
			const slot = await addSlot(gym, { on, setPlaces: 2 });
			const booked = await Promise.all(members.map((id) => book(acting(id), slot, { now })));
			const first = booked[i % 2]!;
			if (first.ok) await cancel(acting(members[i % 2]!), first.booking.id, { now });
		}
		const [sum] = await db.select({ n: sql<number>`sum(amount)` }).from(ledgerEntries);
		expect(sum!.n).toBe(0);
		const uneven = await db.all(
			sql`select transfer_id from ledger_entries group by transfer_id, unit having sum(amount) <> 0`
		);
		expect(uneven).toEqual([]);
		const paid = await db.select().from(bookings).where(eq(bookings.status, 'booked'));
		const balances = (await Promise.all(members.map((id) => passesOf(id))))
			.flat()
			.map((p) => p.balance);
		expect(balances.reduce((a, b) => a + b, 0)).toBe(12 - paid.length);
	});
});
