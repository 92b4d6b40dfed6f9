import { and, asc, eq, gt, inArray, isNull, min, or, count } from 'drizzle-orm';
import { db, type Queryable } from '../db';
import { classTypes, people, rooms, series, seriesCoaches, slots } from '../db/schema';

/** A recurring class in the list. */
export type SeriesRow = {
	id: number;
	classType: string;
	room: string;
	coaches: string[];
	startsOn: string;
	startTime: string;
	lengthMin: number;
	rule: string;
	/** The first slot still ahead, epoch ms; null where there is none. */
	nextAt: number | null;
	slotsAhead: number;
};

/** The series that go on, by time of day. */
export async function listSeries(now: number, q: Queryable = db): Promise<SeriesRow[]> {
	const rows = await q
		.select({ series, classType: classTypes.name, room: rooms.name })
		.from(series)
		.innerJoin(classTypes, eq(classTypes.id, series.classTypeId))
		.innerJoin(rooms, eq(rooms.id, series.roomId))
		.where(or(isNull(series.endedAt), gt(series.endedAt, now)))
		.orderBy(asc(series.startTime), asc(series.id));
	const ids = rows.map((row) => row.series.id);
	const [coaches, ahead] = await Promise.all([
		q
			.select({ seriesId: seriesCoaches.seriesId, name: people.name })
			.from(seriesCoaches)
			.innerJoin(people, eq(people.id, seriesCoaches.personId))
			.where(inArray(seriesCoaches.seriesId, ids))
			.orderBy(asc(seriesCoaches.position)),
		q
			.select({ seriesId: slots.seriesId, nextAt: min(slots.startsAt), n: count() })
			.from(slots)
			.where(and(inArray(slots.seriesId, ids), gt(slots.startsAt, now), isNull(slots.cancelledAt)))
			.groupBy(slots.seriesId)
	]);
	return rows.map(({ series: one, classType, room }) => {
		const next = ahead.find(({ seriesId }) => seriesId === one.id);
		return {
			id: one.id,
			classType,
			room,
			coaches: coaches.filter((c) => c.seriesId === one.id).map(({ name }) => name),
			startsOn: one.startsOn,
			startTime: one.startTime,
			lengthMin: one.lengthMin,
			rule: one.rule,
			nextAt: next?.nextAt ?? null,
			slotsAhead: next?.n ?? 0
		};
	});
}
