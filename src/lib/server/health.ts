import { sql } from 'drizzle-orm';
import { db } from './db';

let migrated = false;

/** Set once the process came up whole. */
export const markReady = (): void => void (migrated = true);

/** Whether migrations ran and the database answers. */
export async function isHealthy(): Promise<boolean> {
	if (!migrated) return false;
	try {
		await db.run(sql`select 1`);
		return true;
	} catch {
		return false;
	}
}
