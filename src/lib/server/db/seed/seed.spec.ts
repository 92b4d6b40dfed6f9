import { sql } from 'drizzle-orm';
import { copyFileSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, inject, it } from 'vitest';
import { cutOffAt, bookingWindow } from '$lib/domain/booking';
import { instantOf, localDateOf } from '$lib/domain/calendar';
import { addDays, weekOf, weekday } from '$lib/domain/calendar/civil-date';
import { refusals, shortages } from '$lib/domain/kit';
import { closeDatabase, db, openDatabase } from '..';
import { isPassword } from '../../auth/password';
import { kitRegister } from '../../kit/in-service';
import { library } from '../../kit/library';
import { clustersOf, problemOf } from '../../kit/plan';
import { extendHorizon } from '../../slots/extend-horizon';
import { planSlotsBetween } from '../../slots/plan-slots';
import { slotsBetween } from '../../slots/queries';
import { shortagesAhead } from '../../slots/shortages';
import { seedDemo } from '.';

const zone = 'Europe/Dublin';
const hourMs = 3_600_000;
const dayMs = 24 * hourMs;
/** Tuesday 1 December 2026, 10:00 in Galway. */
const now = Date.UTC(2026, 11, 1, 10);

let folder = '';
async function seedAt(at: number): Promise<void> {
	folder = mkdtempSync(join(tmpdir(), 'kithour-seed-'));
	copyFileSync(inject('templateDatabase'), join(folder, 'seed.db'));
	await openDatabase(`file:${join(folder, 'seed.db')}`);
	await seedDemo({ now: at });
}
async function clear(): Promise<void> {
	await closeDatabase();
	rmSync(folder, { recursive: true, force: true });
}

const all = <T>(query: string) => db.all<T>(sql.raw(query));
const one = async <T>(query: string) => (await all<{ v: T }>(query))[0]!.v;

/** Every row of every table, without the salted hashes of the password. */
async function rows(): Promise<Record<string, unknown[]>> {
	const tables = await all<{ name: string }>(
		"select name from sqlite_master where type = 'table' and name not like '%drizzle%'"
	);
	const found: Record<string, unknown[]> = {};
	for (const { name } of tables) {
		const read = await all<Record<string, unknown>>(`select * from "${name}" order by rowid`);
		found[name] = read.map((row) => ({ ...row, password_hash: null }));
	}
	return found;
}

/** What holds on whatever day the demo starts. */
async function expectSoundGym(at: number): Promise<void> {
	const mondayOn = addDays(weekOf(localDateOf(at, zone)), 7);
	const nextWeek = {
		fromAt: instantOf(mondayOn, '00:00', zone),
		toAt: instantOf(addDays(mondayOn, 7), '00:00', zone)
	};
	const short = await shortagesAhead({ fromAt: at, toAt: at + 40 * dayMs });
	expect(short.map(({ item, isForBooked }) => [item, isForBooked])).toEqual([['rowers', false]]);
	expect(short[0]!.fromAt).toBeGreaterThan(nextWeek.fromAt);
	expect(short[0]!.toAt).toBeLessThan(nextWeek.toAt);
	expect(short[0]!.blocks).toHaveLength(2);

	const ahead = (await slotsBetween(at, at + 40 * dayMs)).filter((s) => s.cancelledAt === null);
	for (const { places, startsOn } of ahead) {
		expect(places.booked + places.held, startsOn).toBeLessThanOrEqual(places.limit);
		if (places.waitlisted > 0) expect(places.free, startsOn).toBe(0);
	}
	const near = ahead.filter(({ startsAt }) => startsAt < at + 14 * dayMs);
	expect(near.filter(({ places }) => places.waitlisted > 0).length).toBeGreaterThanOrEqual(3);
	expect(near.filter(({ places }) => places.free > 0).length).toBeGreaterThan(60);
	const nearlyFull = near.filter(({ places }) => places.free === 1 || places.free === 2);
	expect(nearlyFull.length).toBeGreaterThanOrEqual(1);
	expect(near[0]!.startsAt).toBeLessThan(at + 2 * dayMs);

	const own = await all<{ status: string; startsAt: number; startsOn: string }>(
		`select b.status, s.starts_at as startsAt, s.starts_on as startsOn from bookings b
		 join slots s on s.id = b.slot_id join people p on p.id = b.person_id
		 where p.email = 'member@ropewalk.example' order by s.starts_at`
	);
	const statuses = (status: string) => own.filter((booking) => booking.status === status);
	expect(statuses('booked')).toHaveLength(2);
	expect(statuses('booked')[0]!.startsAt).toBeGreaterThan(at);
	const gap = weekday(localDateOf(at, zone)) >= 6 ? 3 : 2;
	expect(statuses('booked')[0]!.startsAt).toBeLessThan(at + gap * dayMs);
	expect(statuses('waitlisted')).toHaveLength(1);
	expect(statuses('attended').length).toBeGreaterThan(8);
	expect(statuses('cancelled')).toHaveLength(1);
}

describe('the demo gym', () => {
	let tookMs = 0;
	beforeAll(async () => {
		const started = performance.now();
		await seedAt(now);
		tookMs = performance.now() - started;
	}, 120_000);
	afterAll(clear);

	it('is seeded quickly enough: far below the fifteen seconds on a busy machine too', () => {
		expect(tookMs).toBeLessThan(45_000);
	});

	it('has a place for everybody who is promised one: staff and 126 members, on one password', async () => {
		expect(await one("select count(*) as v from person_roles where role = 'member'")).toBe(126);
		const coaches = "select count(*) as v from person_roles where role in ('coach', 'head_coach')";
		expect(await one(coaches)).toBe(4);
		const keys = ['owner', 'head', 'coach', 'desk', 'member'];
		for (let i = 1; i <= 120; i += 1) keys.push(`member${String(i).padStart(3, '0')}`);
		const accounts = await all<{ email: string; hash: string; verified: number | null }>(
			`select email, password_hash as hash, email_verified_at as verified from people
			 where password_hash is not null`
		);
		const named = new Map(accounts.map((account) => [account.email, account]));
		for (const key of keys) {
			const account = named.get(`${key}@ropewalk.example`);
			expect(account?.verified, key).toBeGreaterThan(0);
		}
		const { hash } = named.get('member120@ropewalk.example')!;
		expect(await isPassword(hash, 'ropewalk-demo')).toBe(true);
		expect(new Set(accounts.map((account) => account.hash))).toEqual(new Set([hash]));
	});

	it('owns the kit that it says, and one rope is out of service', async () => {
		const owned = await all<{ name: string; n: number; kinds: number }>(
			`select g.name, sum(i.count) as n, count(*) as kinds from kit_items i
			 join kit_groups g on g.id = i.kit_group_id group by g.id order by g.position`
		);
		expect(owned.map(({ name, n, kinds }) => [name, n, kinds])).toEqual([
			['pull-up bar place', 8, 1],
			['dumbbell pair', 34, 11],
			['kettlebell', 10, 5],
			['rower', 6, 1],
			['air bike', 4, 1],
			['box', 10, 1],
			['long band', 12, 1],
			['skipping rope', 14, 1],
			['bench', 8, 2],
			['pair of rings', 6, 1],
			['mat', 20, 1]
		]);
		const pairs = await all<{ kg: number; n: number }>(
			`select i.load_kg as kg, i.count as n from kit_items i join kit_groups g
			 on g.id = i.kit_group_id where g.name = 'dumbbell pair' order by 1`
		);
		expect(pairs.map(({ kg }) => kg)).toEqual(Array.from({ length: 11 }, (_, i) => 5 + i * 2.5));
		expect(pairs.every(({ n }) => n >= 2 && n <= 4)).toBe(true);
		expect(await one('select count(*) as v from kit_spells')).toBe(1);
	});

	it('has about forty-five classes a week on all days but Sunday, and needs no more for 26 weeks', async () => {
		const week = await all<{ startsOn: string; n: number }>(
			`select starts_on as startsOn, count(*) as n from slots
			 where starts_on between '2026-12-07' and '2026-12-13' group by 1`
		);
		expect(week.map(({ startsOn }) => weekday(startsOn))).toEqual([1, 2, 3, 4, 5, 6]);
		expect(week.reduce((sum, { n }) => sum + n, 0)).toBe(45);
		const sundays = "select count(*) as v from slots where strftime('%w', starts_on) = '0'";
		expect(await one(sundays)).toBe(0);
		expect(await extendHorizon({ now })).toEqual({ made: 0, leftOut: 0 });
	});

	it('has its sessions laid for weeks, shown for two, and leaves the last days to the head coach', async () => {
		const weeks = await all<{ week: string; laid: number; shown: number; n: number }>(
			`select date(starts_on, 'weekday 0', '-6 days') as week, count(session_revision_id) as laid,
			 count(session_published_at) as shown, count(*) as n from slots
			 where starts_on between '2026-11-30' and '2027-01-10' group by 1 order by 1`
		);
		expect(weeks.map(({ laid, shown }) => [laid, shown])).toEqual([
			[45, 45],
			[45, 45],
			[45, 0],
			[42, 0],
			[24, 0],
			[0, 0]
		]);
		expect(
			await one('select count(distinct training_session_id) as v from session_revisions')
		).toBe(24);
	});

	it('asks for no kit in a way that cannot be counted, and books nobody past the kit', async () => {
		const to = now + 40 * dayMs;
		const around = await planSlotsBetween(now, to);
		const [lib, register] = [await library(), await kitRegister(now, to)];
		const problems = clustersOf(around).map((cluster) => problemOf(cluster, lib, register));
		expect(problems.flatMap(refusals)).toEqual([]);
		expect(problems.flatMap(shortages)).toEqual([]);
		const chosen = around.flatMap(({ people }) => people).map(({ choices }) => choices);
		expect(
			chosen.filter(({ variations }) => Object.keys(variations!).length > 0).length
		).toBeGreaterThan(80);
		expect(chosen.filter(({ loads }) => Object.keys(loads!).length > 0).length).toBeGreaterThan(80);
	});

	it('is sound: one shortage next week, free places, full classes, a member with something to see', async () => {
		await expectSoundGym(now);
	});

	it('lets nobody book before it opens, late cancel in time, or be in two classes at once', async () => {
		const bookings = await all<{
			id: number;
			status: string;
			createdAt: number;
			updatedAt: number;
			startsAt: number;
			startsOn: string;
			opensDaysBefore: number;
			cutOffMin: number | null;
			cutOffClock: string | null;
		}>(
			`select b.id, b.status, b.created_at as createdAt, b.updated_at as updatedAt,
			 s.starts_at as startsAt, s.starts_on as startsOn, c.opens_days_before as opensDaysBefore,
			 c.cut_off_min as cutOffMin, c.cut_off_clock as cutOffClock
			 from bookings b join slots s on s.id = b.slot_id join class_types c on c.id = s.class_type_id`
		);
		const wrong = bookings.filter((b) => {
			const { opensAt } = bookingWindow({ ...b, closesMinBefore: 0, zone });
			const inTime = b.updatedAt <= cutOffAt({ ...b, zone });
			const isWrongCancel =
				(b.status === 'cancelled' && !inTime) || (b.status === 'late-cancelled' && inTime);
			const isEarly = b.createdAt < opensAt || b.createdAt > now || b.updatedAt > now;
			return isWrongCancel || isEarly;
		});
		expect(wrong).toEqual([]);
		expect(new Set(bookings.map(({ status }) => status))).toEqual(
			new Set([
				'booked',
				'waitlisted',
				'attended',
				'no-show',
				'cancelled',
				'late-cancelled',
				'released'
			])
		);
		const twice = await one(
			`select count(*) as v from bookings a join slots s on s.id = a.slot_id
			 join bookings b on b.person_id = a.person_id and b.id > a.id join slots t on t.id = b.slot_id
			 where s.starts_at < t.ends_at and t.starts_at < s.ends_at
			 and a.status in ('booked','waitlisted','attended') and b.status in ('booked','waitlisted','attended')`
		);
		expect(twice).toBe(0);
	});

	it('has taken the roll of every class that ended, and late is a mark on who came', async () => {
		const open = `select count(*) as v from bookings b join slots s on s.id = b.slot_id
			where s.ends_at <= ${now} and b.status in ('booked', 'held', 'waitlisted')`;
		expect(await one(open)).toBe(0);
		const late = "select count(*) as v from bookings where is_late = 1 and status = 'attended'";
		expect(await one<number>(late)).toBeGreaterThan(20);
		expect(
			await one("select count(*) as v from bookings where is_late = 1 and status <> 'attended'")
		).toBe(0);
	});

	it('has each place paid by one thing, packs in the ledger, memberships within their week', async () => {
		const unpaid = `select count(*) as v from bookings where status not in ('waitlisted')
			and (pass_id is null) = (complimentary_by_id is null)`;
		expect(await one(unpaid)).toBe(0);
		expect(await one('select sum(amount) as v from ledger_entries')).toBe(0);
		const uses = await all<{ paid: number; used: number }>(
			`select (select count(*) from bookings b where b.pass_id = p.id
			   and b.status not in ('cancelled', 'released')) as paid,
			 10 - (select sum(amount) from ledger_entries where account = 'pass:' || p.id) as used
			 from passes p where p.kind = 'pack'`
		);
		expect(uses.length).toBeGreaterThan(20);
		expect(uses.filter(({ paid, used }) => paid !== used)).toEqual([]);
		const over = await all(
			`select p.id from bookings b join passes p on p.id = b.pass_id join slots s on s.id = b.slot_id
			 where p.per_week is not null and b.status in ('booked','attended','no-show','late-cancelled')
			 group by p.id, date(s.starts_on, 'weekday 0', '-6 days') having count(*) > p.per_week`
		);
		expect(over).toEqual([]);
	});

	it('says in the booking’s changes how it came to be as it is', async () => {
		const apart = await one(
			`select count(*) as v from bookings b where b.status <> (select to_status from booking_changes c
			 where c.booking_id = b.id order by c.id desc limit 1)`
		);
		expect(apart).toBe(0);
	});

	it('has the staff’s commands in its audit log', async () => {
		const verbs = await all<{ verb: string }>('select distinct verb from audit_entries');
		expect(verbs.map(({ verb }) => verb)).toEqual(
			expect.arrayContaining([
				'passes.grant',
				'roll.mark',
				'roll.close',
				'slots.lay',
				'weeks.publish',
				'series.add',
				'closures.close',
				'slots.call-off',
				'bookings.walk-in'
			])
		);
	});
});

describe('the demo gym, again', () => {
	it('is the same gym, row by row, for the same instant', async () => {
		await seedAt(now);
		const first = await rows();
		await clear();
		await seedAt(now);
		const second = await rows();
		await clear();
		expect(Object.keys(first).length).toBeGreaterThan(25);
		expect(second).toEqual(first);
	}, 120_000);

	it.each([
		['a Saturday evening', '2026-12-05T20:30:00Z'],
		['a Sunday', '2026-07-12T11:00:00Z'],
		['an early morning with a class running', '2027-03-24T06:45:00Z'],
		['the week before the clocks go back', '2026-10-22T16:50:00Z']
	])(
		'is sound on %s',
		async (_, at) => {
			await seedAt(Date.parse(at));
			try {
				await expectSoundGym(Date.parse(at));
			} finally {
				await clear();
			}
		},
		120_000
	);
});
