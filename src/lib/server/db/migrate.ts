import { migrate } from 'drizzle-orm/libsql/migrator';
import { inTurn, writerConnection } from './write';

/** Brings the open database to the newest schema. `folder` is the `drizzle` folder beside the build. */
export function migrateDatabase(folder = 'drizzle'): Promise<void> {
	return inTurn(() => migrate(writerConnection().db, { migrationsFolder: folder }));
}
