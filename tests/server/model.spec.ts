import { asc, eq, sql } from 'drizzle-orm';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { book } from '../../src/lib/server/bookings/book';
import { cancel } from '../../src/lib/server/bookings/cancel';
import { db } from '../../src/lib/server/db';
import { bookings, ledgerEntries, slots } from '../../src/lib/server/db/schema';
import { markRoll } from '../../src/lib/server/roll/mark';
import { BookingModel, type Answer, type Command, type Mutation } from '../support/booking-model';
import { useDatabase } from '../support/database';
import { acting, addMembers, addSlot, addSpecGym, specNow } from '../support/gym';

/** Fifteen thousand commands in all by `FULL=1`; a short form otherwise. */
const [runs, length] = process.env.FULL ? [60, 250] : [4, 150];
const members = 8;
const credits = 6;
const places = 2;
/** One after the other on the afternoon that the commands go through. */
const slotCount = 5;

const number = (most: number) => fc.nat(most - 1);
const command: fc.Arbitrary<Command> = fc.oneof(
	{
		weight: 6,
		arbitrary: fc.record({
			do: fc.constant('book' as const),
			member: number(members),
			slot: number(slotCount)
		})
	},
	{ weight: 4, arbitrary: fc.record({ do: fc.constant('cancel' as const), booking: number(40) }) },
	{
		weight: 1,
		arbitrary: fc.record({ do: fc.constant('check-in' as const), booking: number(40) })
	},
	{ weight: 1, arbitrary: fc.record({ do: fc.constant('undo' as const), booking: number(40) }) },
	{
		weight: 1,
		arbitrary: fc.record({
			do: fc.constant('wait' as const),
			minutes: fc.integer({ min: 1, max: 60 })
		})
	}
);

/** A gym with the model beside it; says in what they differ after each command. */
async function pair(wrong?: Mutation) {
	const gym = await addSpecGym({ barPlaces: 40 });
	const slotIds: number[] = [];
	for (const time of ['14:00', '15:15', '16:30', '17:45', '19:00']) {
		slotIds.push(await addSlot(gym, { on: '2026-12-01', time, setPlaces: places }));
	}
	const memberIds = await addMembers(members, credits);
	const times = await db.select().from(slots).orderBy(asc(slots.id));
	const model = new BookingModel(
		times.map(({ startsAt, endsAt }) => ({ startsAt, endsAt, places })),
		members,
		credits,
		specNow,
		wrong
	);
	const desk = acting(gym.deskId, 'front_desk');
	const ids: number[] = [];

	async function inTheGym(asked: Command): Promise<Answer> {
		const now = model.now;
		if (asked.do === 'wait') return { ok: true, said: 'waited' };
		if (asked.do === 'book') {
			const got = await book(acting(memberIds[asked.member]!), slotIds[asked.slot]!, { now });
			if (!got.ok) return { ok: false, said: got.refused };
			ids.push(got.booking.id);
			return { ok: true, said: got.booking.status };
		}
		const id = ids[asked.booking];
		if (id === undefined) return { ok: false, said: 'not-found' };
		const row = (await db.select().from(bookings).where(eq(bookings.id, id)).get())!;
		if (asked.do === 'cancel') {
			const got = await cancel(acting(row.personId), id, { now });
			return got.ok ? { ok: true, said: got.booking.status } : { ok: false, said: got.refused };
		}
		const status = asked.do === 'check-in' ? 'attended' : 'booked';
		const got = await markRoll(desk, row.slotId, [{ bookingId: id, status }], { now });
		return got.ok ? { ok: true, said: status } : { ok: false, said: got.refused };
	}

	return {
		async differs(asked: Command): Promise<string | null> {
			const real = await inTheGym(asked);
			const said = model.run(asked);
			if (JSON.stringify(real) !== JSON.stringify(said)) {
				return `${JSON.stringify(asked)}: ${JSON.stringify(real)}, not ${JSON.stringify(said)}`;
			}
			const rows = await db.select().from(bookings).orderBy(asc(bookings.id));
			const statuses = rows.map(({ status }) => status).join();
			const expected = model.bookings.map(({ status }) => status).join();
			return statuses === expected
				? null
				: `${JSON.stringify(asked)}: ${statuses}, not ${expected}`;
		},
		async creditsDiffer(): Promise<string | null> {
			const left = await db
				.select({ account: ledgerEntries.account, sum: sql<number>`sum(${ledgerEntries.amount})` })
				.from(ledgerEntries)
				.groupBy(ledgerEntries.account);
			const total = left.reduce((sum, row) => sum + row.sum, 0);
			if (total !== 0) return `the ledger sums to ${total}`;
			const packs = left.filter(({ account }) => account.startsWith('pass:'));
			const sums = packs.map(({ sum }) => sum).sort((a, b) => a - b);
			const expected = [...model.credits].sort((a, b) => a - b);
			return JSON.stringify(sums) === JSON.stringify(expected) ? null : `${sums}, not ${expected}`;
		}
	};
}

async function firstDifference(commands: Command[], wrong?: Mutation): Promise<string | null> {
	const both = await pair(wrong);
	for (const asked of commands) {
		const difference = await both.differs(asked);
		if (difference) return difference;
	}
	return both.creditsDiffer();
}

const commandsOf = (seed: number) =>
	fc.sample(fc.array(command, { minLength: length, maxLength: length }), { seed, numRuns: 1 })[0]!;
const seeds = Array.from({ length: runs }, (_, i) => (i % 2 ? Date.now() + i : 20261201 + i));

describe('booking beside a model of it (goal G5)', () => {
	useDatabase();

	it.each(seeds)(`answers ${length} commands as the model does (seed %i)`, async (seed) => {
		expect(await firstDifference(commandsOf(seed))).toBeNull();
	});

	it.each<Mutation>(['last-in-first', 'no-refund', 'a-place-too-many', 'promotes-late', 'free'])(
		'would notice a model that is wrong: %s',
		async (wrong) => {
			const found = await firstDifference(commandsOf(7).concat(commandsOf(8)), wrong);
			expect(found).not.toBeNull();
		}
	);
});
