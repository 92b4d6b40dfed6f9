import { asc, eq, isNull } from 'drizzle-orm';
import { db, type Queryable } from '../db';
import { series, seriesCoaches } from '../db/schema';

/** A series with its coaches, lead coach first. */
export type SeriesWithCoaches = typeof series.$inferSelect & { coachIds: number[] };

export async function findSeries(
	id: number,
	q: Queryable = db
): Promise<SeriesWithCoaches | null> {
	const [row] = await q.select().from(series).where(eq(series.id, id));
	if (!row) return null;
	const coaches = await q
		.select({ personId: seriesCoaches.personId })
		.from(seriesCoaches)
		.where(eq(seriesCoaches.seriesId, id))
		.orderBy(asc(seriesCoaches.position));
	return { ...row, coachIds: coaches.map(({ personId }) => personId) };
}

/** Series that nobody ended, oldest first. */
export async function liveSeriesIds(q: Queryable = db): Promise<number[]> {
	const rows = await q
		.select({ id: series.id })
		.from(series)
		.where(isNull(series.endedAt))
		.orderBy(asc(series.id));
	return rows.map(({ id }) => id);
}
