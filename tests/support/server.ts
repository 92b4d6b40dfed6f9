import { spawn, type ChildProcess } from 'node:child_process';
import { copyFileSync, mkdtempSync, rmSync } from 'node:fs';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

export type RunningServer = {
	/** The address that browsers use: ORIGIN. */
	origin: string;
	/** Where it really listens, for fetches: differs from `origin` when that is made up. */
	url: string;
	/** The page of the mail fake; `/api/mails?to=` answers JSON. */
	mailUrl: string;
	databaseFile: string;
	/** Everything it printed so far. */
	output: () => string;
	stop: (signal?: NodeJS.Signals) => Promise<number | null>;
};

type Options = {
	/** A database file to start from; a copy of it is used. Left out: an empty database. */
	template?: string;
	env?: Record<string, string>;
};

/** Starts the built application on a free port with its own copy of a database, in mode "test". */
export async function startServer({ template, env = {} }: Options = {}): Promise<RunningServer> {
	const folder = mkdtempSync(join(tmpdir(), 'kithour-server-'));
	const databaseFile = join(folder, 'gym.db');
	if (template) copyFileSync(template, databaseFile);
	const port = await freePorts(3);
	const origin = env.ORIGIN ?? `http://localhost:${port}`;
	const child = spawn(process.execPath, ['build'], {
		stdio: 'pipe',
		env: {
			...process.env,
			NODE_ENV: undefined,
			KITHOUR_MODE: 'test',
			HOST: '127.0.0.1',
			PORT: String(port),
			ORIGIN: origin,
			DATABASE_URL: `file:${databaseFile}`,
			AUTH_SECRET: 'only-for-tests-only-for-tests-only',
			BODY_SIZE_LIMIT: '6M',
			SHUTDOWN_TIMEOUT: '2',
			...env
		}
	});
	let printed = '';
	child.stdout.on('data', (chunk: Buffer) => (printed += chunk.toString()));
	child.stderr.on('data', (chunk: Buffer) => (printed += chunk.toString()));

	const url = `http://127.0.0.1:${port}`;
	await untilHealthy(url, child, () => printed);
	return {
		origin,
		url,
		mailUrl: `http://127.0.0.1:${port + 1}`,
		databaseFile,
		output: () => printed,
		stop: async (signal = 'SIGTERM') => {
			const code = await stopped(child, signal);
			rmSync(folder, { recursive: true, force: true });
			return code;
		}
	};
}

async function untilHealthy(url: string, child: ChildProcess, printed: () => string) {
	for (let tries = 0; tries < 300; tries += 1) {
		if (child.exitCode !== null) throw new Error(`the server stopped: ${printed()}`);
		const answer = await fetch(`${url}/api/health`).catch(() => null);
		if (answer?.ok) return;
		await new Promise((later) => setTimeout(later, 100));
	}
	child.kill('SIGKILL');
	throw new Error(`the server did not come up: ${printed()}`);
}

function stopped(child: ChildProcess, signal: NodeJS.Signals): Promise<number | null> {
	if (child.exitCode !== null) return Promise.resolve(child.exitCode);
	return new Promise((done) => {
		child.once('exit', (code) => done(code));
		child.kill(signal);
	});
}

/** The first of `count` ports in a row that nobody listens on. */
async function freePorts(count: number): Promise<number> {
	for (;;) {
		const first = 20_000 + Math.floor(Math.random() * 30_000);
		const free = await Promise.all(Array.from({ length: count }, (_, i) => isFree(first + i)));
		if (free.every(Boolean)) return first;
	}
}

const isFree = (port: number) =>
	new Promise<boolean>((answer) => {
		const probe = createServer();
		probe.once('error', () => answer(false));
		probe.listen(port, '127.0.0.1', () => probe.close(() => answer(true)));
	});
