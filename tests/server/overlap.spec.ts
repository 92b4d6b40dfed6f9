import fc from 'fast-check';
import { beforeEach, describe, expect, it } from 'vitest';
import { createClient, type Client } from '@libsql/client';
import { useDatabase } from '../support/database';
import { addTimetable } from '../support/timetable';

/*
 * G3: two slots never stand in one room at once, and no coach in two, unless an override was
 * recorded. Raw SQL, so that the schema alone answers. Held to a plain comparison of intervals.
 */
const database = useDatabase();
beforeEach(addTimetable);

type Drawn = { room: number; coach: number; from: number; minutes: number; override: boolean };
const drawn: fc.Arbitrary<Drawn> = fc.record({
	room: fc.integer({ min: 1, max: 2 }),
	coach: fc.integer({ min: 1, max: 2 }),
	from: fc.integer({ min: 0, max: 1440 }),
	minutes: fc.integer({ min: 5, max: 720 }),
	override: fc.boolean()
});
const base = Date.parse('2027-01-04T00:00:00Z');
const startOf = (slot: Drawn) => base + slot.from * 60_000;
const endOf = (slot: Drawn) => startOf(slot) + slot.minutes * 60_000;
const overlap = (a: Drawn, b: Drawn) => startOf(a) < endOf(b) && endOf(a) > startOf(b);

const run = (client: Client, sql: string, args: (string | number | null)[]) =>
	client.execute({ sql, args }).then(
		() => 'done',
		(error: unknown) => /(room|coach)-overlap/.exec(String(error))?.[0] ?? String(error)
	);

async function allow(client: Client, uid: string) {
	for (const kind of ['room', 'coach']) {
		const sql =
			'insert into clash_overrides (slot_uid, kind, why, at, by_id) values (?, ?, ?, 1, 1)';
		await run(client, sql, [uid, kind, 'said so']);
	}
}

const insertSlot = (client: Client, uid: string, slot: Drawn) =>
	run(
		client,
		`insert into slots (uid, class_type_id, room_id, starts_on, start_time, starts_at, ends_at, modified_at, created_at)
		 values (?, 1, ?, '2027-01-04', '00:00', ?, ?, 1, 1)`,
		[uid, slot.room, startOf(slot), endOf(slot)]
	);

const insertCoach = (client: Client, uid: string, slot: Drawn) =>
	run(
		client,
		'insert into slot_coaches (slot_id, person_id) values ((select id from slots where uid = ?), ?)',
		[uid, slot.coach]
	);

describe('a room or a coach, asked for twice at once', () => {
	it('is refused by the schema, whatever the intervals, unless an override was recorded', async () => {
		const client = createClient({ url: `file:${database.file()}` });
		let round = 0;
		await fc.assert(
			fc.asyncProperty(fc.array(drawn, { minLength: 2, maxLength: 8 }), async (all) => {
				round += 1;
				await client.execute('delete from slot_coaches');
				await client.execute('delete from slots');
				const standing: Drawn[] = [];
				const coaching: Drawn[] = [];
				for (const [i, slot] of all.entries()) {
					const uid = `${round}-${i}`;
					if (slot.override) await allow(client, uid);
					const roomTaken = standing.some((s) => s.room === slot.room && overlap(s, slot));
					const placed = await insertSlot(client, uid, slot);
					expect(placed).toBe(roomTaken && !slot.override ? 'room-overlap' : 'done');
					if (placed !== 'done') continue;
					standing.push(slot);
					const coachTaken = coaching.some((s) => s.coach === slot.coach && overlap(s, slot));
					const given = await insertCoach(client, uid, slot);
					expect(given).toBe(coachTaken && !slot.override ? 'coach-overlap' : 'done');
					if (given === 'done') coaching.push(slot);
				}
			}),
			{ numRuns: 60 }
		);
		client.close();
	});

	it('is refused to a slot that moves, changes room or coach, or is brought back', async () => {
		const client = createClient({ url: `file:${database.file()}` });
		let round = 0;
		const moves = fc.tuple(drawn, drawn, drawn);
		await fc.assert(
			fc.asyncProperty(moves, async ([one, other, to]) => {
				round += 1;
				await client.execute('delete from slot_coaches');
				await client.execute('delete from slots');
				const [a, b] = [`a${round}`, `b${round}`];
				await insertSlot(client, a, { ...one, override: false });
				await insertCoach(client, a, one);
				const far = { ...other, from: other.from + 3000 };
				await insertSlot(client, b, far);
				await insertCoach(client, b, far);
				const meets = overlap(one, to);
				const asked = [to.room, startOf(to), endOf(to), b];
				const sql = 'update slots set room_id = ?, starts_at = ?, ends_at = ? where uid = ?';
				const isTaken = meets && (one.room === to.room || one.coach === far.coach);
				expect((await run(client, sql, asked)) === 'done').toBe(!isTaken);
				await run(client, 'update slots set cancelled_at = 1 where uid = ?', [b]);
				expect(await run(client, sql, asked)).toBe('done');
				const back = await run(client, 'update slots set cancelled_at = null where uid = ?', [b]);
				expect(back === 'done').toBe(!isTaken);
				if (isTaken) {
					await allow(client, b);
					const again = await run(client, 'update slots set cancelled_at = null where uid = ?', [
						b
					]);
					expect(again).toBe('done');
				}
			}),
			{ numRuns: 80 }
		);
		client.close();
	});

	it('notices a build without its triggers', async () => {
		const client = createClient({ url: `file:${database.file()}` });
		await client.execute('drop trigger slots_room_free_insert');
		const slot = { room: 1, coach: 1, from: 0, minutes: 60, override: false };
		expect(await insertSlot(client, 'x', slot)).toBe('done');
		expect(await insertSlot(client, 'y', slot)).toBe('done');
		const { rows } = await client.execute(
			'select count(*) n from slots a join slots b on a.id < b.id and a.room_id = b.room_id and a.starts_at < b.ends_at and a.ends_at > b.starts_at'
		);
		expect(rows[0]!.n).toBe(1);
		client.close();
	});
});
