import { cpSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createClient, type Client } from '@libsql/client';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { closeDatabase, openDatabase } from '../../src/lib/server/db';
import { migrateDatabase } from '../../src/lib/server/db/migrate';
import { rowsAfter } from '../support/migration-fixture';

/*
 * G30: a database of each past schema, filled, comes to the newest one with every row and without
 * an orphan. A migration that rebuilds a table could drop its children without a word.
 */
type Journal = { entries: { idx: number; tag: string; when: number }[] };
const journal = JSON.parse(readFileSync('drizzle/meta/_journal.json', 'utf8')) as Journal;

let folder = '';
beforeEach(() => {
	folder = mkdtempSync(join(tmpdir(), 'kithour-migrations-'));
});
afterEach(async () => {
	await closeDatabase();
	rmSync(folder, { recursive: true, force: true });
});

/** The migrations as they were when there were so many of them. */
function pastMigrations(count: number): string {
	const past = join(folder, `drizzle-${count}`);
	cpSync('drizzle', past, { recursive: true });
	const entries = journal.entries.slice(0, count);
	writeFileSync(join(past, 'meta/_journal.json'), JSON.stringify({ ...journal, entries }));
	return past;
}

async function migrateTo(url: string, migrations: string) {
	await openDatabase(url);
	await migrateDatabase(migrations);
	await closeDatabase();
}

async function tableCounts(client: Client): Promise<Record<string, number>> {
	const { rows } = await client.execute(
		"select name from sqlite_master where type = 'table' and name not like 'sqlite_%' and name not like '\\_\\_%' escape '\\'"
	);
	const counts: Record<string, number> = {};
	for (const { name } of rows) {
		const found = await client.execute(`select count(*) n from "${name}"`);
		counts[String(name)] = Number(found.rows[0]!.n);
	}
	return counts;
}

async function fill(url: string, migrations: number) {
	const client = createClient({ url });
	for (const [table, row] of rowsAfter(migrations)) {
		const columns = Object.keys(row);
		const marks = columns.map(() => '?').join(', ');
		const sql = `insert into "${table}" (${columns.join(', ')}) values (${marks})`;
		await client.execute({ sql, args: Object.values(row) });
	}
	const counts = await tableCounts(client);
	client.close();
	return counts;
}

async function read(url: string) {
	const client = createClient({ url });
	const counts = await tableCounts(client);
	const orphans = (await client.execute('pragma foreign_key_check')).rows;
	const [integrity] = (await client.execute('pragma integrity_check')).rows;
	client.close();
	return { counts, orphans, integrity: integrity!.integrity_check };
}

describe('a database of an earlier version', () => {
	const versions = journal.entries.map(({ idx, tag }) => [tag, idx + 1] as const);

	it.each(versions)(
		'that had come to %s keeps every row and has no orphan',
		async (_tag, count) => {
			const url = `file:${join(folder, 'past.db')}`;
			await migrateTo(url, pastMigrations(count));
			const before = await fill(url, count);
			expect(Object.values(before).every((n) => n > 0)).toBe(true);
			await migrateTo(url, 'drizzle');
			const after = await read(url);
			expect(after.counts).toMatchObject(before);
			expect(after.orphans).toEqual([]);
			expect(after.integrity).toBe('ok');
		}
	);

	it('would be seen to lose rows by a migration that rebuilds a table and forgets them', async () => {
		const url = `file:${join(folder, 'past.db')}`;
		const count = journal.entries.length;
		await migrateTo(url, 'drizzle');
		const before = await fill(url, count);
		await migrateTo(url, brokenMigrations(count));
		const after = await read(url);
		expect(after.counts.kit_spells).toBe(0);
		expect(before.kit_spells).toBe(1);
	});
});

/** One migration more, which rebuilds a table without its rows. */
function brokenMigrations(count: number): string {
	const broken = pastMigrations(count);
	const last = journal.entries.at(-1)!;
	const entry = { ...last, idx: count, tag: `${count}_broken`, when: last.when + 1000 };
	const entries = [...journal.entries, entry];
	writeFileSync(join(broken, 'meta/_journal.json'), JSON.stringify({ ...journal, entries }));
	const sql =
		'CREATE TABLE `__new` AS SELECT * FROM `kit_spells` WHERE 0;--> statement-breakpoint\nDROP TABLE `kit_spells`;--> statement-breakpoint\nALTER TABLE `__new` RENAME TO `kit_spells`;';
	writeFileSync(join(broken, `${count}_broken.sql`), sql);
	return broken;
}
