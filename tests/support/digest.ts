import { sql } from 'drizzle-orm';
import { db } from '../../src/lib/server/db';

/** Every row of every table, as text: equal before and after what changed nothing. */
export async function everyRow(): Promise<string> {
	const tables = await db.all<{ name: string }>(
		sql`select name from sqlite_master where type = 'table' and name not like 'sqlite_%' order by name`
	);
	const rows = [];
	for (const { name } of tables)
		rows.push([name, await db.all(sql.raw(`select * from "${name}"`))]);
	return JSON.stringify(rows);
}
