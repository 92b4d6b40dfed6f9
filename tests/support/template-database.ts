import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { TestProject } from 'vitest/node';
import { closeDatabase, openDatabase } from '../../src/lib/server/db';
import { checkpointDatabase } from '../../src/lib/server/db/checkpoint';
import { migrateDatabase } from '../../src/lib/server/db/migrate';

declare module 'vitest' {
	interface ProvidedContext {
		templateDatabase: string;
	}
}

/** Migrates one database for the whole run; each test copies the file (0.5 ms) instead of migrating. */
export default async function setup(project: TestProject) {
	const folder = mkdtempSync(join(tmpdir(), 'kithour-template-'));
	const file = join(folder, 'template.db');
	await openDatabase(`file:${file}`);
	await migrateDatabase();
	await checkpointDatabase();
	await closeDatabase();
	project.provide('templateDatabase', file);
	return () => rmSync(folder, { recursive: true, force: true });
}
