import { copyFileSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, inject } from 'vitest';
import { closeDatabase, openDatabase } from '../../src/lib/server/db';

/** Gives every test of the file its own migrated database: a real libSQL file, copied from the template. */
export function useDatabase(template = inject('templateDatabase')): { file: () => string } {
	let folder = '';
	beforeEach(async () => {
		folder = mkdtempSync(join(tmpdir(), 'kithour-test-'));
		copyFileSync(template, join(folder, 'test.db'));
		await openDatabase(`file:${join(folder, 'test.db')}`);
	});
	afterEach(async () => {
		await closeDatabase();
		rmSync(folder, { recursive: true, force: true });
	});
	return { file: () => join(folder, 'test.db') };
}
