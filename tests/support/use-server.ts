import { copyFileSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, inject } from 'vitest';
import { closeDatabase, openDatabase } from '../../src/lib/server/db';
import { checkpointDatabase } from '../../src/lib/server/db/checkpoint';
import { startServer, type RunningServer } from './server';

/**
 * Starts the built application once for the tests of a file, on a migrated database that
 * `fill` put its people and classes into, or on a copy of another `template`. The server owns
 * the file from then on.
 */
export function useServer(
	fill: () => Promise<void> = async () => undefined,
	env: Record<string, string> = {},
	template: () => string = () => inject('templateDatabase')
): () => RunningServer {
	let running: RunningServer | null = null;
	beforeAll(async () => {
		const folder = mkdtempSync(join(tmpdir(), 'kithour-fill-'));
		const file = join(folder, 'filled.db');
		copyFileSync(template(), file);
		await openDatabase(`file:${file}`);
		await fill();
		await checkpointDatabase();
		await closeDatabase();
		running = await startServer({ template: file, env });
		rmSync(folder, { recursive: true, force: true });
	}, 120_000);
	afterAll(async () => {
		await running?.stop();
	});
	return () => {
		if (!running) throw new Error('the server is not up yet');
		return running;
	};
}
