import type { SQLiteTable } from 'drizzle-orm/sqlite-core';
import type { Tx } from '..';

/** Enough to be quick, few enough to stay far below SQLite's 32,766 parameters a statement. */
const batch = 300;

/** Inserts rows in order, many at a time, and lets the process breathe in between. */
export async function insertAll<T extends SQLiteTable>(
	tx: Tx,
	table: T,
	rows: readonly T['$inferInsert'][]
): Promise<void> {
	for (let from = 0; from < rows.length; from += batch) {
		await tx.insert(table).values(rows.slice(from, from + batch) as T['$inferInsert'][]);
		await new Promise(setImmediate);
	}
}
