// The demo from a bare clone, with nothing but Node: installs, builds, seeds, starts, tells where.
import { createHash } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { createServer } from 'node:net';
import { join } from 'node:path';
import { buildIsStale } from './stale.js';
import { root, run, secret, start } from './start.js';

const port = Number(process.env.PORT || 4173);
const origin = process.env.ORIGIN || `http://localhost:${port}`;

await refuseBusyPorts();
installWhenChanged();
if (buildIsStale(root)) {
	console.log('kithour: building, this takes about a minute');
	run('npm', ['run', 'build']);
}

const server = start('node', ['build'], {
	KITHOUR_MODE: 'demo',
	PORT: String(port),
	ORIGIN: origin,
	DATABASE_URL: process.env.DATABASE_URL || `file:${join(root, 'data', 'demo.db')}`,
	AUTH_SECRET: process.env.AUTH_SECRET || secret('demo.secret'),
	BODY_SIZE_LIMIT: '6M',
	SHUTDOWN_TIMEOUT: '10'
});
await up(server);

console.log(`
  Ropewalk Strength is open.

  Sign in at   ${origin}/sign-in
  Mail arrives ${`http://localhost:${port + 1}`}

  owner@ropewalk.example    the owner
  head@ropewalk.example     the head coach
  coach@ropewalk.example    a coach
  desk@ropewalk.example     the front desk
  member@ropewalk.example   a member
  The password of each is   ropewalk-demo

  Ctrl-C stops it; the data stays in data/demo.db.
`);

/** The app's port and those of the mail fake: said in one line, before anything takes a minute. */
async function refuseBusyPorts() {
	for (const wanted of [port, port + 1, port + 2]) {
		if (await isFree(wanted)) continue;
		console.error(
			`kithour: port ${wanted} is taken; give another, such as PORT=${port + 10} npm run demo`
		);
		process.exit(1);
	}
}

/** @param {number} wanted @returns {Promise<boolean>} */
function isFree(wanted) {
	return new Promise((answer) => {
		const probe = createServer();
		probe.once('error', () => answer(false));
		probe.listen(wanted, () => probe.close(() => answer(true)));
	});
}

/** Installs when there is nothing yet or the lock has changed since. */
function installWhenChanged() {
	const lock = createHash('sha256')
		.update(readFileSync(join(root, 'package-lock.json')))
		.digest('hex');
	const mark = join(root, 'node_modules', '.kithour-lock');
	if (existsSync(mark) && readFileSync(mark, 'utf8') === lock) return;
	console.log('kithour: installing');
	run('npm', ['ci', '--no-audit', '--no-fund']);
	writeFileSync(mark, lock);
}

/** @param {import('node:child_process').ChildProcess} child */
async function up(child) {
	while (child.exitCode === null) {
		const answer = await fetch(`http://127.0.0.1:${port}/api/health`).catch(() => null);
		if (answer?.ok) return;
		await new Promise((later) => setTimeout(later, 200));
	}
	process.exit(child.exitCode);
}
