import { asc, eq, gt, isNull, or } from 'drizzle-orm';
import { db, type Queryable } from '../db';
import { series, seriesCoaches } from '../db/schema';

/** A series with its coaches, lead coach first. */
export type SeriesWithCoaches = typeof series.$inferSelect & { coachIds: number[] };

export async function findSeries(id: number, q: Queryable = db): Promise<SeriesWithCoaches | null> {
	const [row] = await q.select().from(series).where(eq(series.id, id));
	if (!row) return null;
	const coaches = await q
		.select({ personId: seriesCoaches.personId })
		.from(seriesCoaches)
		.where(eq(seriesCoaches.seriesId, id))
		.orderBy(asc(seriesCoaches.position));
	return { ...row, coachIds: coaches.map(({ personId }) => personId) };
}

/** Series that go on after `now`, oldest first. */
export async function liveSeriesIds(now: number, q: Queryable = db): Promise<number[]> {
	const rows = await q
		.select({ id: series.id })
		.from(series)
		.where(or(isNull(series.endedAt), gt(series.endedAt, now)))
		.orderBy(asc(series.id));
	return rows.map(({ id }) => id);
}
