import { desc, eq } from 'drizzle-orm';
import { db, type Queryable } from '../db';
import { people, publications } from '../db/schema';

/** When a week was last published, and by whom; null where never. */
export async function lastPublication(
	weekOn: string,
	q: Queryable = db
): Promise<{ at: number; by: string } | null> {
	const [last] = await q
		.select({ at: publications.at, by: people.name })
		.from(publications)
		.innerJoin(people, eq(people.id, publications.byId))
		.where(eq(publications.weekOn, weekOn))
		.orderBy(desc(publications.at))
		.limit(1);
	return last ?? null;
}
