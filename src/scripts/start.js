import { spawn, spawnSync } from 'node:child_process';
import { randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

export const root = join(dirname(fileURLToPath(import.meta.url)), '..', '..');

/**
 * A secret that stays the same from start to start, so that restarting keeps people signed in.
 * @param {string} name
 */
export function secret(name) {
	const folder = join(root, 'data');
	const file = join(folder, name);
	mkdirSync(folder, { recursive: true });
	if (!existsSync(file))
		writeFileSync(file, randomBytes(32).toString('base64url'), { mode: 0o600 });
	return readFileSync(file, 'utf8').trim();
}

/**
 * Runs one command to its end; its failure is ours.
 * @param {string} command
 * @param {string[]} args
 */
export function run(command, args) {
	const { status } = spawnSync(command, args, { cwd: root, stdio: 'inherit' });
	if (status !== 0) process.exit(status ?? 1);
}

/**
 * Starts a child that stops with us and we with it.
 * @param {string} command
 * @param {string[]} args
 * @param {Record<string, string>} environment
 */
export function start(command, args, environment) {
	const child = spawn(command === 'node' ? process.execPath : command, args, {
		cwd: root,
		stdio: 'inherit',
		env: { ...process.env, ...environment }
	});
	for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM'])) {
		process.on(signal, () => child.kill('SIGTERM'));
	}
	child.on('exit', (code) => process.exit(code ?? 0));
	return child;
}
