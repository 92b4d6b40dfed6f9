import { execFileSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, readFileSync, renameSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

/** What the seeded rows follow from; a change to any of it seeds anew. */
const sources = ['drizzle', 'src/lib/domain', 'src/lib/server', 'src/scripts/seed.ts'];

/**
 * A database file with the demo gym as it stands at `now` (epoch ms). It is seeded once for the
 * same sources and instant, and is a template: copy it, never open it. Runs in a process of its
 * own, so that a database that is open here stays open.
 */
export function seededDatabase(now: number): string {
	const folder = join(tmpdir(), 'kithour-seeded');
	mkdirSync(folder, { recursive: true });
	const file = join(folder, `${digest()}-${now}.db`);
	if (existsSync(file)) return file;
	const making = `${file}.${process.pid}`;
	rmSync(making, { force: true });
	const script = ['--import', 'tsx', 'src/scripts/seed.ts', making, new Date(now).toISOString()];
	execFileSync(process.execPath, script, { stdio: ['ignore', 'ignore', 'inherit'] });
	renameSync(making, file);
	return file;
}

function digest(): string {
	const hash = createHash('sha256');
	for (const source of sources.flatMap(filesIn)) hash.update(source).update(readFileSync(source));
	return hash.digest('hex').slice(0, 16);
}

function filesIn(source: string): string[] {
	if (!existsSync(source)) return [];
	if (/\.\w+$/.test(source)) return [source];
	const names = readdirSync(source, { recursive: true, withFileTypes: true });
	return names
		.filter((entry) => entry.isFile() && !entry.name.endsWith('.spec.ts'))
		.map((entry) => join(entry.parentPath, entry.name))
		.sort();
}
