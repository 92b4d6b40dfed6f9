import { and, eq, gt, inArray, sql } from 'drizzle-orm';
import { beforeAll, afterAll, describe, expect, inject, it } from 'vitest';
import { copyFileSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { addDays, weekOf } from '$lib/domain/calendar/civil-date';
import { refusals, shortages } from '$lib/domain/kit';
import { closeDatabase, db, openDatabase } from '..';
import { kitRegister } from '../../kit/in-service';
import { library } from '../../kit/library';
import { clustersOf, problemOf } from '../../kit/plan';
import { planSlotsBetween } from '../../slots/plan-slots';
import { slotsBetween } from '../../slots/queries';
import { shortagesAhead } from '../../slots/shortages';
import {
	bookings,
	kitItems,
	ledgerEntries,
	movements,
	passes,
	people,
	personRoles,
	slots,
	trainingSessions
} from '../schema';
import { seedDemo } from '.';

/** Tuesday 1 December 2026, 09:00 in Galway. */
const now = Date.UTC(2026, 11, 1, 9);
const day = 86_400_000;
const count = async (
	table: typeof bookings | typeof movements | typeof trainingSessions | typeof slots | typeof people
) => (await db.select({ n: sql<number>`count(*)` }).from(table))[0]!.n;

describe('the demo gym', () => {
	let folder = '';
	let tookMs = 0;
	beforeAll(async () => {
		folder = mkdtempSync(join(tmpdir(), 'kithour-seed-'));
		copyFileSync(inject('templateDatabase'), join(folder, 'seed.db'));
		await openDatabase(`file:${join(folder, 'seed.db')}`);
		const started = performance.now();
		await seedDemo({ now });
		tookMs = performance.now() - started;
	}, 120_000);
	afterAll(async () => {
		await closeDatabase();
		rmSync(folder, { recursive: true, force: true });
	});

	it('has its people, movements, sessions and about 45 classes a week, none on Sunday', async () => {
		expect(await count(movements)).toBe(60);
		expect(await count(trainingSessions)).toBe(24);
		const members = await db.select().from(personRoles).where(eq(personRoles.role, 'member'));
		expect(members.length).toBeGreaterThanOrEqual(126);
		const week = await db
			.select()
			.from(slots)
			.where(and(gt(slots.startsOn, '2026-12-06'), sql`${slots.startsOn} < '2026-12-14'`));
		expect(week).toHaveLength(45);
		expect(week.filter(({ startsOn }) => new Date(startsOn).getUTCDay() === 0)).toEqual([]);
	});

	it('owns the kit that it says', async () => {
		const [bells] = await db
			.select({ n: sql<number>`sum(count)` })
			.from(kitItems)
			.where(sql`kit_group_id = 3`);
		expect(bells!.n).toBe(10);
	});

	it('never books past the kit or the places, whatever the session', async () => {
		const to = now + 40 * day;
		const [around, lib, register] = [
			await planSlotsBetween(now, to),
			await library(),
			await kitRegister(now, to)
		];
		const problems = clustersOf(around).map((cluster) => problemOf(cluster, lib, register));
		expect(problems.flatMap(refusals)).toEqual([]);
		expect(problems.flatMap(shortages)).toEqual([]);
		const ahead = await slotsBetween(now, to);
		expect(ahead.filter(({ places }) => places.booked + places.held > places.limit)).toEqual([]);
		expect(ahead.some(({ places }) => places.free === 0 && places.waitlisted > 0)).toBe(true);
		expect(ahead.filter(({ places }) => places.free > 0).length).toBeGreaterThan(60);
	});

	it('is short of kit once next week, and nowhere else that week', async () => {
		const mondayOn = addDays(weekOf('2026-12-01'), 7);
		const from = Date.parse(`${mondayOn}T00:00:00Z`);
		const found = await shortagesAhead({ fromAt: from, toAt: from + 7 * day });
		expect(found.map(({ item, short, isForBooked }) => ({ item, short, isForBooked }))).toEqual([
			{ item: 'rowers', short: 3, isForBooked: false }
		]);
	});

	it('is short of nothing in the other weeks that are laid', async () => {
		const all = await shortagesAhead({ fromAt: now, toAt: now + 35 * day });
		expect(
			all.map(({ item, short, fromAt }) => [item, short, new Date(fromAt).toISOString()])
		).toHaveLength(1);
	});

	it('balances its ledger, and no pack is overdrawn', async () => {
		const [sum] = await db.select({ n: sql<number>`sum(amount)` }).from(ledgerEntries);
		expect(sum!.n).toBe(0);
		const packs = await db.select().from(passes).where(eq(passes.kind, 'pack'));
		expect(packs.length).toBeGreaterThan(10);
	});

	it('gives the demo member something to see, and is quick', async () => {
		const [member] = await db
			.select()
			.from(people)
			.where(eq(people.email, 'member@ropewalk.example'));
		const own = await db.select().from(bookings).where(eq(bookings.personId, member!.id));
		expect(own.filter(({ status }) => status === 'booked').length).toBeGreaterThanOrEqual(2);
		expect(own.filter(({ status }) => status === 'attended').length).toBeGreaterThan(0);
		expect(await count(bookings)).toBeGreaterThan(2500);
		expect(tookMs).toBeLessThan(60_000);
		const attended = await db
			.select({ n: sql<number>`count(*)` })
			.from(bookings)
			.where(inArray(bookings.status, ['attended']));
		expect(attended[0]!.n).toBeGreaterThan(1500);
	});
});
