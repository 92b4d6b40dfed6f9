// Makes a database with the demo gym: tsx src/scripts/seed.ts gym.db [2026-12-01T10:00:00Z]
import { existsSync } from 'node:fs';
import { closeDatabase, openDatabase } from '../lib/server/db';
import { checkpointDatabase } from '../lib/server/db/checkpoint';
import { migrateDatabase } from '../lib/server/db/migrate';
import { seedDemo } from '../lib/server/db/seed';

const [file, at] = process.argv.slice(2);
const now = at === undefined ? Date.now() : Date.parse(at);
if (file === undefined || Number.isNaN(now)) stop('usage: tsx src/scripts/seed.ts FILE [INSTANT]');
if (existsSync(file)) stop(`${file} is there already; the demo gym goes into an empty database`);

await openDatabase(`file:${file}`);
await migrateDatabase();
await seedDemo({ now });
await checkpointDatabase();
await closeDatabase();

function stop(why: string): never {
	process.stderr.write(`${why}\n`);
	process.exit(1);
}
