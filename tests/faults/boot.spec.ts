import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, describe, expect, inject, it } from 'vitest';
import { closeDatabase, openDatabase, write } from '../../src/lib/server/db';
import { checkpointDatabase } from '../../src/lib/server/db/checkpoint';
import { migrateDatabase } from '../../src/lib/server/db/migrate';
import { gyms } from '../../src/lib/server/db/schema';
import { startServer } from '../support/server';

const folder = mkdtempSync(join(tmpdir(), 'kithour-boot-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

const whole: Record<string, string> = {
	PORT: '65001',
	DATABASE_URL: `file:${join(folder, 'gym.db')}`,
	ORIGIN: 'https://gym.test',
	AUTH_SECRET: 'only-for-tests-only-for-tests-only',
	MAIL_URL: 'smtp://127.0.0.1:1',
	MAIL_FROM: 'desk@gym.test'
};

/** Starts the built application with this environment alone, as production unless it says otherwise. */
function start(env: Record<string, string | undefined>) {
	const { status, stdout, stderr } = spawnSync(process.execPath, ['build'], {
		env: { PATH: process.env.PATH, ...env } as NodeJS.ProcessEnv,
		encoding: 'utf8',
		timeout: 20_000
	});
	return { status, lines: `${stdout}${stderr}`.trim().split('\n') };
}

describe('a start that cannot succeed', () => {
	it.each(['DATABASE_URL', 'ORIGIN', 'AUTH_SECRET', 'MAIL_URL', 'MAIL_FROM'])(
		'names a missing %s in one clear line and ends with 1',
		(name) => {
			const { status, lines } = start({ ...whole, [name]: undefined });
			expect(status).toBe(1);
			expect(lines).toEqual([expect.stringMatching(new RegExp(`^kithour: ${name} is missing: `))]);
		}
	);

	it('names a database that cannot be opened', () => {
		const { status, lines } = start({ ...whole, DATABASE_URL: 'file:/nowhere/at/all/gym.db' });
		expect(status).toBe(1);
		expect(lines).toEqual([expect.stringMatching(/^kithour: DATABASE_URL cannot be used: /)]);
	});

	it('is how production meets a database that the demo made', async () => {
		const file = join(folder, 'demo.db');
		await openDatabase(`file:${file}`);
		await migrateDatabase();
		await write((tx) =>
			tx.insert(gyms).values({
				id: 1,
				name: 'Ropewalk Strength',
				placeName: 'Galway',
				zone: 'Europe/Dublin',
				currency: 'EUR',
				isDemo: true,
				createdAt: 1
			})
		);
		await checkpointDatabase();
		await closeDatabase();
		const { status, lines } = start({ ...whole, DATABASE_URL: `file:${file}` });
		expect(status).toBe(1);
		expect(lines).toEqual([expect.stringContaining('the demo made')]);
	});
});

describe('a start that succeeds', () => {
	it('migrates an empty file, says that there is no gym, and stops when it is told to', async () => {
		const server = await startServer();
		expect(server.output()).toMatch(/no gym yet\. Open \/first-run and enter the code [\w-]{14}\n/);
		expect(server.output()).not.toContain('only-for-tests');
		expect(await server.stop()).toBe(0);
	});

	it('keeps its data when it is started again', async () => {
		const server = await startServer({ template: inject('templateDatabase') });
		expect((await fetch(`${server.url}/api/slots`)).status).toBe(503);
		expect(await server.stop('SIGINT')).toBe(0);
	});
});
