import { readdirSync, statSync } from 'node:fs';
import { join } from 'node:path';

const sources = [
	'src',
	'static',
	'package-lock.json',
	'svelte.config.js',
	'tailwind.config.ts',
	'vite.config.ts'
];

/**
 * Whether anything that goes into the build is newer than the build.
 * @param {string} root
 */
export function buildIsStale(root) {
	const built = changedAt(join(root, 'build', 'index.js'));
	return sources.some((source) => newest(join(root, source)) > built);
}

/** @param {string} path @returns {number} */
function newest(path) {
	if (path.endsWith(join('wording', 'compiled'))) return 0;
	const at = changedAt(path);
	if (at === 0 || !statSync(path).isDirectory()) return at;
	return Math.max(at, ...readdirSync(path).map((name) => newest(join(path, name))));
}

/** @param {string} path */
function changedAt(path) {
	return statSync(path, { throwIfNoEntry: false })?.mtimeMs ?? 0;
}
