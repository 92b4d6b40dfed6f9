import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { book } from '../../src/lib/server/bookings/book';
import { closeDatabase, openDatabase } from '../../src/lib/server/db';
import { migrateDatabase } from '../../src/lib/server/db/migrate';
import { inTurn, writerConnection } from '../../src/lib/server/db/write';
import { acting, addMembers, addSlot, addSpecGym, specNow } from '../support/gym';
import { addDays } from '../../src/lib/domain/calendar/civil-date';
import { median } from './median';
import type { Figure } from './run';

/** Bookings in one round. */
const each = 120;

type Statement = { sql: string; args: never[] };

/**
 * Bookings a second through the command, beside the raw ceiling of stack.md: the statements that
 * the command sent, recorded, sent again in one transaction through the same mutex by the
 * libSQL client alone.
 */
export async function benchBooking(): Promise<Figure[]> {
	const folder = mkdtempSync(join(tmpdir(), 'kithour-bench-'));
	try {
		await openDatabase(`file:${join(folder, 'bench.db')}`);
		await migrateDatabase();
		const gym = await addSpecGym({ barPlaces: 40 });
		const members = await addMembers(240);
		const slots: number[] = [];
		for (let day = 0; day < 20; day += 1) {
			const on = addDays('2026-12-03', day);
			for (const time of ['06:30', '12:15', '18:00']) slots.push(await addSlot(gym, { on, time }));
		}
		const asks = slots.flatMap((slot, s) =>
			members.slice((s % 12) * 17, (s % 12) * 17 + 17).map((id) => ({ slot, id }))
		);
		await book(acting(asks[0]!.id), asks[0]!.slot, { now: specNow });
		const recorded = await record(() => book(acting(asks[1]!.id), asks[1]!.slot, { now: specNow }));

		// In turns, the first to warm up, so that what else the machine does weighs on both alike.
		const rates = [];
		for (let from = 2; from + each <= asks.length; from += each) {
			const part = asks.slice(from, from + each);
			rates.push({ command: await throughCommand(part), ceiling: await raw(recorded, each) });
		}
		const command = median(rates.slice(1).map((rate) => rate.command));
		const ceiling = median(rates.slice(1).map((rate) => rate.ceiling));
		return [
			{ name: 'bookings through the command', value: command, unit: 'a second' },
			{
				name: 'raw ceiling: the same statements by the client alone',
				value: ceiling,
				unit: 'a second'
			},
			{
				name: 'share of the ceiling',
				value: (command / ceiling) * 100,
				unit: '%',
				target: 'at least 60'
			}
		];
	} finally {
		await closeDatabase();
		rmSync(folder, { recursive: true, force: true });
	}
}

async function throughCommand(asks: { slot: number; id: number }[]): Promise<number> {
	const started = performance.now();
	const answers = await Promise.all(
		asks.map(({ slot, id }) => book(acting(id), slot, { now: specNow }))
	);
	const rate = (asks.length / (performance.now() - started)) * 1000;
	const booked = answers.filter((a) => a.ok && a.booking.status === 'booked').length;
	if (booked < asks.length * 0.9) throw new Error(`only ${booked} of ${asks.length} were booked`);
	return rate;
}

/** The statements of one transaction, as they reach the client. */
async function record(work: () => Promise<unknown>): Promise<Statement[]> {
	const { client } = writerConnection();
	const begin = client.transaction.bind(client);
	const seen: Statement[] = [];
	client.transaction = async (mode?: never) => {
		const tx = await begin(mode as never);
		const execute = tx.execute.bind(tx);
		tx.execute = ((statement: Statement) => {
			seen.push(statement);
			return execute(statement);
		}) as typeof tx.execute;
		return tx;
	};
	await work();
	client.transaction = begin;
	return seen;
}

async function raw(statements: Statement[], rounds: number): Promise<number> {
	const { client } = writerConnection();
	const started = performance.now();
	for (let i = 0; i < rounds; i += 1) {
		await inTurn(async () => {
			const tx = await client.transaction('write');
			for (const statement of statements) await tx.execute(fresh(statement));
			await tx.commit();
		});
	}
	return (rounds / (performance.now() - started)) * 1000;
}

/** An insert of a booking is sent as one that cannot clash with those that are there. */
function fresh({ sql, args }: Statement): Statement {
	if (!sql.startsWith('insert into "bookings"')) return { sql, args };
	return {
		sql: sql.replace("'booked'", "'cancelled'"),
		args: args.map((arg) => ((arg as unknown) === 'booked' ? 'cancelled' : arg)) as never[]
	};
}
