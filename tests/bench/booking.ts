import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { book } from '../../src/lib/server/bookings/book';
import { closeDatabase, openDatabase } from '../../src/lib/server/db';
import { migrateDatabase } from '../../src/lib/server/db/migrate';
import { inTurn, writerConnection } from '../../src/lib/server/db/write';
import { acting, addMembers, addSlot, addSpecGym, specNow } from '../support/gym';
import type { Figure } from './run';

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
		const days = Array.from({ length: 24 }, (_, i) => `2026-12-${String(3 + i).padStart(2, '0')}`);
		const slots: number[] = [];
		for (const on of days) slots.push(await addSlot(gym, { on }));
		const asks = slots.flatMap((slot, s) =>
			members.slice((s % 12) * 17, (s % 12) * 17 + 17).map((id) => ({ slot, id }))
		);
		await book(acting(asks[0]!.id), asks[0]!.slot, { now: specNow });
		const recorded = await record(() => book(acting(asks[1]!.id), asks[1]!.slot, { now: specNow }));

		const rest = asks.slice(2);
		const started = performance.now();
		const answers = await Promise.all(
			rest.map(({ slot, id }) => book(acting(id), slot, { now: specNow }))
		);
		const command = (rest.length / (performance.now() - started)) * 1000;
		const booked = answers.filter((a) => a.ok && a.booking.status === 'booked').length;
		if (booked < rest.length * 0.9) throw new Error(`only ${booked} of ${rest.length} were booked`);

		const ceiling = await raw(recorded, rest.length);
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
