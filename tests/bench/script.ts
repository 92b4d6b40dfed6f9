import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { gzipSync } from 'node:zlib';
import type { Figure } from './run';

const output = '.svelte-kit/output';
const page = 'src/routes/(member)/classes/+page.svelte';

/** Compressed script that the member timetable loads: the entry, the layouts and the page, followed through their imports. */
export async function benchScript(): Promise<Figure[]> {
	const manifestPath = join(output, 'client/.vite/manifest.json');
	if (!existsSync(manifestPath)) throw new Error('Build first: npm run build');
	const manifest: Record<string, { file: string; imports?: string[] }> = JSON.parse(
		readFileSync(manifestPath, 'utf8')
	);
	const seen = new Set<string>();
	for (const key of entries(manifest)) follow(manifest, key, seen);
	const bytes = [...seen]
		.map((key) => manifest[key]!.file)
		.filter((file) => file.endsWith('.js'))
		.reduce((sum, file) => sum + gzipSync(readFileSync(join(output, 'client', file))).length, 0);
	return [
		{
			name: 'compressed script on the member timetable',
			value: bytes / 1024,
			unit: 'KiB',
			target: 'under 110'
		}
	];
}

/** The client entry and app, and the generated nodes of the timetable and its layouts. */
function entries(manifest: Record<string, unknown>): string[] {
	const routes = ['src/routes/+layout', 'src/routes/(member)/+layout', page.replace('.svelte', '')];
	const nodes = Object.keys(manifest).filter((key) => {
		if (/client\/(start|app)\.js$/.test(key) || /runtime\/client\/entry\.js$/.test(key))
			return true;
		const at = key.match(/client-optimized\/nodes\/(\d+)\.js$/);
		if (!at) return false;
		const source = readFileSync(
			join('.svelte-kit/generated/client-optimized/nodes', `${at[1]}.js`),
			'utf8'
		);
		return routes.some((route) => source.includes(`${route}.`));
	});
	if (!nodes.some((key) => key.includes('nodes')))
		throw new Error('the timetable is not in the build');
	return nodes;
}

function follow(
	manifest: Record<string, { file: string; imports?: string[] }>,
	key: string,
	seen: Set<string>
) {
	if (seen.has(key)) return;
	seen.add(key);
	for (const next of manifest[key]?.imports ?? []) follow(manifest, next, seen);
}
