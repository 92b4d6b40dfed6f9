// `npm test` from a bare clone: installs, brings Debian's Chromium if none is there, runs
// everything, and ends with one line of what passed. Plain Node: it runs before the install.
import { spawn, spawnSync } from 'node:child_process';
import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { createHash } from 'node:crypto';

const totals = { passed: 0, failed: 0 };
const started = Date.now();
/** @type {[string, string, string[]][]} */
const sources = [
	['Lint', 'npx', ['eslint', '--max-warnings', '0', '.']],
	['Unused code', 'npx', ['knip', '--no-progress']],
	['Format', 'npx', ['prettier', '--check', '--log-level', 'warn', '.']]
];
/** @type {[string, string, string[]][]} */
const types = [
	['Types', 'npm', ['run', '--silent', 'check']],
	['Build', 'npm', ['run', '--silent', 'build']]
];

install();
bringChromium();
rmSync('test-results', { recursive: true, force: true });
await step('Wording', 'npm', ['run', '--silent', 'sync']);
await Promise.all([lane(sources), lane(types)]);
suite(
	'Rules and components',
	['vitest', 'run', '--project', 'unit', '--project', 'component'],
	'unit'
);
suite('Server', ['vitest', 'run', '--project', 'server'], 'server');
suite('Faults, short form', ['vitest', 'run', '--project', 'faults'], 'faults');
suite('Journeys', ['playwright', 'test'], 'e2e');
finish();

/** Steps of one core each, one after the other; lanes run side by side. */
async function lane(/** @type {[string, string, string[]][]} */ steps) {
	for (const [name, command, args] of steps) await step(name, command, args);
}

function install() {
	const lock = createHash('sha256').update(readFileSync('package-lock.json')).digest('hex');
	const stamp = 'node_modules/.kithour-lock';
	if (existsSync(stamp) && readFileSync(stamp, 'utf8') === lock) return;
	if (!run('npm', ['ci', '--no-audit', '--no-fund'])) fail('npm ci did not succeed');
	writeFileSync(stamp, lock);
}

function bringChromium() {
	if (existsSync('/usr/bin/chromium')) return;
	if (!run('apt-get', ['update', '-qq'])) fail('apt-get update did not succeed');
	const chromium = [
		'install',
		'-y',
		'-qq',
		'--no-install-recommends',
		'chromium',
		'fonts-liberation'
	];
	if (!run('apt-get', chromium)) fail('Chromium could not be installed');
}

/** @param {string} name @param {string} command @param {string[]} args */
async function step(name, command, args) {
	const at = Date.now();
	const ok = await ran(command, args);
	console.log(`${ok ? 'ok' : 'FAILED'}  ${name}, ${Math.round((Date.now() - at) / 1000)} s`);
	if (ok) totals.passed += 1;
	else fail(`${name} did not pass`);
}

/** @param {string} command @param {string[]} args @returns {Promise<boolean>} */
function ran(command, args) {
	const child = spawn(command, args, { stdio: 'inherit', env: process.env });
	return new Promise((done) => {
		child.once('error', () => done(false));
		child.once('exit', (code) => done(code === 0));
	});
}

/** @param {string} name @param {string[]} args @param {string} key */
function suite(name, args, key) {
	const at = Date.now();
	const report = `test-results/${key}.json`;
	const reporters =
		key === 'e2e' ? [] : ['--reporter=default', '--reporter=json', `--outputFile=${report}`];
	const ok = run('npx', [...args, ...reporters]);
	count(report, key);
	console.log(`${ok ? 'ok' : 'FAILED'}  ${name}, ${Math.round((Date.now() - at) / 1000)} s`);
	if (!ok) {
		totals.failed = Math.max(1, totals.failed);
		finish();
	}
}

/** @param {string} report @param {string} key */
function count(report, key) {
	if (!existsSync(report)) return;
	const read = JSON.parse(readFileSync(report, 'utf8'));
	totals.passed += key === 'e2e' ? read.stats.expected + read.stats.flaky : read.numPassedTests;
	totals.failed += key === 'e2e' ? read.stats.unexpected : read.numFailedTests;
}

/** @param {string} command @param {string[]} args */
function run(command, args) {
	return spawnSync(command, args, { stdio: 'inherit', env: process.env }).status === 0;
}

/** @param {string} why */
function fail(why) {
	console.log(why);
	totals.failed += 1;
	finish();
}

function finish() {
	console.log(`${Math.round((Date.now() - started) / 1000)} s in all`);
	console.log(`${totals.passed} passed, ${totals.failed} failed`);
	process.exit(totals.failed ? 1 : 0);
}
