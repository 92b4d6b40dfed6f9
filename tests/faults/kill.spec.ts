import { spawn } from 'node:child_process';
import { copyFileSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { sql } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, inject, it } from 'vitest';
import { closeDatabase, db, openDatabase, write } from '../../src/lib/server/db';
import { bookings, ledgerEntries, outboxMessages } from '../../src/lib/server/db/schema';
import { addDays } from '../../src/lib/domain/calendar/civil-date';
import { addMembers, addSlot, addSpecGym } from '../support/gym';

/** Fifty kills, and a thousand acknowledgements or more, by `FULL=1`; a short form otherwise. */
const kills = process.env.FULL ? 50 : 3;

type Said = {
	booked?: number;
	status?: string;
	cancelled?: number;
	promoted?: number[];
};

/** What was acknowledged and is not in the file; empty where nothing was lost. */
async function lost(said: readonly Said[]): Promise<string[]> {
	const rows = new Map((await db.select().from(bookings)).map((row) => [row.id, row]));
	const told = new Set((await db.select().from(outboxMessages)).map(({ factKey }) => factKey));
	const faults: string[] = [];
	for (const { booked, cancelled, promoted = [] } of said) {
		if (booked !== undefined && !rows.has(booked)) faults.push(`booking ${booked} is gone`);
		if (cancelled !== undefined && !rows.get(cancelled)?.status.includes('cancelled')) {
			faults.push(`cancellation of ${cancelled} is gone`);
		}
		for (const id of promoted) {
			if (![...told].some((key) => key.startsWith(`booking:${id}:`))) {
				faults.push(`nobody is told of the promotion of ${id}`);
			}
		}
	}
	return faults;
}

async function soundness(): Promise<string[]> {
	const [integrity] = await db.all<{ integrity_check: string }>(sql`pragma integrity_check`);
	const orphans = await db.all(sql`pragma foreign_key_check`);
	const [ledger] = await db
		.select({ sum: sql<number>`coalesce(sum(${ledgerEntries.amount}), 0)` })
		.from(ledgerEntries);
	const over = await db.all(
		sql`select slot_id from bookings where status in ('booked', 'attended') group by slot_id having count(*) > 12`
	);
	return [
		...(integrity?.integrity_check === 'ok' ? [] : ['the file is broken']),
		...(orphans.length > 0 ? ['rows without their parents'] : []),
		...(ledger?.sum === 0 ? [] : ['the ledger does not sum to zero']),
		...(over.length > 0 ? ['a class with a place too many'] : [])
	];
}

describe('a process that is killed while it books (goal G6)', () => {
	let folder = '';
	let file = '';
	let args: string[] = [];
	beforeAll(async () => {
		folder = mkdtempSync(join(tmpdir(), 'kithour-kill-'));
		file = join(folder, 'gym.db');
		copyFileSync(inject('templateDatabase'), file);
		await openDatabase(`file:${file}`);
		const gym = await addSpecGym({ barPlaces: 40 });
		const members = await addMembers(60, 50);
		const slots: number[] = [];
		for (let day = 0; day < 10; day += 1) {
			slots.push(await addSlot(gym, { on: addDays('2026-12-03', day), setPlaces: 12 }));
		}
		await closeDatabase();
		args = [file, members.join(','), slots.join(',')];
	});
	afterAll(async () => {
		await closeDatabase();
		rmSync(folder, { recursive: true, force: true });
	});

	/** Lets the child work until it has acknowledged some, then kills it without a warning. */
	function killedAfter(acknowledgements: number): Promise<Said[]> {
		const script = ['--import', 'tsx', 'tests/support/kill-child.ts', ...args];
		const child = spawn(process.execPath, script, { stdio: ['ignore', 'pipe', 'inherit'] });
		let printed = '';
		child.stdout.on('data', (chunk: Buffer) => {
			printed += chunk.toString();
			if (printed.split('\n').length > acknowledgements) child.kill('SIGKILL');
		});
		return new Promise((done) => {
			child.once('close', () => {
				const whole = printed.slice(0, printed.lastIndexOf('\n') + 1);
				done(
					whole
						.split('\n')
						.filter(Boolean)
						.map((line) => JSON.parse(line) as Said)
				);
			});
		});
	}

	it(`loses nothing that was acknowledged, ${kills} times`, async () => {
		const all: Said[] = [];
		for (let kill = 0; kill < kills; kill += 1) {
			all.push(...(await killedAfter(20 + ((kill * 7) % 25))));
			await openDatabase(`file:${file}`);
			expect(await soundness()).toEqual([]);
			expect(await lost(all)).toEqual([]);
			await closeDatabase();
		}
		expect(all.length).toBeGreaterThanOrEqual(kills * 20);
	}, 600_000);

	it('would be found out: a row that is gone, a credit from nowhere', async () => {
		await openDatabase(`file:${file}`);
		expect(await lost([{ booked: 999_999 }])).toEqual(['booking 999999 is gone']);
		expect(await lost([{ promoted: [999_999] }])).toHaveLength(1);
		await write((tx) =>
			tx.run(sql`insert into ledger_entries (transfer_id, account, unit, amount)
				select min(id), 'issued', 'credit', 5 from ledger_transfers`)
		).catch(() => undefined);
		const isWrong = (await soundness()).length > 0;
		const isRefused = (await db.select().from(ledgerEntries)).every(({ amount }) => amount !== 5);
		expect(isWrong || isRefused).toBe(true);
	});
});
