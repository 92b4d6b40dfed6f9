import { eq } from 'drizzle-orm';
import type { Tx } from '../db';
import { series, seriesCoaches } from '../db/schema';
import type { SeriesColumns } from './read-draft';

export async function insertSeries(
	tx: Tx,
	columns: SeriesColumns,
	coachIds: readonly number[],
	more: Pick<
		typeof series.$inferInsert,
		'clashesAllowed' | 'createdAt' | 'createdById' | 'splitFromId'
	>
): Promise<number> {
	const [made] = await tx
		.insert(series)
		.values({ ...columns, ...more })
		.returning({ id: series.id });
	await setSeriesCoaches(tx, made!.id, coachIds);
	return made!.id;
}

export async function setSeriesCoaches(
	tx: Tx,
	seriesId: number,
	coachIds: readonly number[]
): Promise<void> {
	await tx.delete(seriesCoaches).where(eq(seriesCoaches.seriesId, seriesId));
	await tx
		.insert(seriesCoaches)
		.values(coachIds.map((personId, position) => ({ seriesId, personId, position })));
}
