import { and, asc, eq, isNull, max, sql } from 'drizzle-orm';
import { secondsPerRep } from '$lib/domain/training';
import { db, type Queryable } from '../db';
import { programmes, sessionRevisions, slots, trainingSessions } from '../db/schema';
import { library } from '../kit/library';
import { blocksOf } from './queries';
import { titledBlocks, type TitledBlock } from './titled-blocks';

/** A session that can be laid, by its current revision. */
export type ShelfSession = {
	id: number;
	title: string;
	programme: string | null;
	lengthMin: number;
	blocks: TitledBlock[];
	/** The latest day up to `todayOn` on which it was laid; null where never. */
	usedOn: string | null;
};

/** Every session in use, by programme and title. */
export async function sessionShelf(todayOn: string, q: Queryable = db): Promise<ShelfSession[]> {
	const [rows, used, lib] = await Promise.all([
		q
			.select({
				id: trainingSessions.id,
				title: trainingSessions.title,
				programme: programmes.name,
				lengthMin: trainingSessions.lengthMin,
				content: sessionRevisions.content
			})
			.from(trainingSessions)
			.innerJoin(
				sessionRevisions,
				and(
					eq(sessionRevisions.trainingSessionId, trainingSessions.id),
					eq(sessionRevisions.number, trainingSessions.revisionNumber)
				)
			)
			.leftJoin(programmes, eq(programmes.id, trainingSessions.programmeId))
			.where(isNull(trainingSessions.archivedAt))
			.orderBy(
				sql`${programmes.position} is null`,
				asc(programmes.position),
				asc(trainingSessions.title)
			),
		q
			.select({ id: sessionRevisions.trainingSessionId, on: max(slots.startsOn) })
			.from(slots)
			.innerJoin(sessionRevisions, eq(sessionRevisions.id, slots.sessionRevisionId))
			.where(and(isNull(slots.cancelledAt), sql`${slots.startsOn} <= ${todayOn}`))
			.groupBy(sessionRevisions.trainingSessionId),
		library(q)
	]);
	const usedOn = new Map(used.map(({ id, on }) => [id, on]));
	const perRep = secondsPerRep(lib.rules);
	return rows.map(({ content, ...row }) => ({
		...row,
		blocks: titledBlocks(blocksOf(content, row.lengthMin * 60_000, perRep)),
		usedOn: usedOn.get(row.id) ?? null
	}));
}
