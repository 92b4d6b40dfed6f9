import { asc, eq, isNull } from 'drizzle-orm';
import type { ClosedDays } from '$lib/domain/calendar/closures';
import { db, type Queryable } from '../db';
import { closures, rooms } from '../db/schema';

export type Closure = typeof closures.$inferSelect;

/** Closures that nobody ended. */
export async function closedDays(q: Queryable = db): Promise<ClosedDays[]> {
	return q
		.select({ roomId: closures.roomId, fromOn: closures.fromOn, toOn: closures.toOn })
		.from(closures)
		.where(isNull(closures.endedAt));
}

/** A closure in the list; `room` null is the whole gym. */
export type ClosureRow = Pick<Closure, 'id' | 'fromOn' | 'toOn' | 'why' | 'endedAt'> & {
	room: string | null;
};

/** Closures that end on `fromOn` or later, first day first. */
export async function listClosures(fromOn: string, q: Queryable = db): Promise<ClosureRow[]> {
	const rows = await q
		.select({
			id: closures.id,
			fromOn: closures.fromOn,
			toOn: closures.toOn,
			why: closures.why,
			endedAt: closures.endedAt,
			room: rooms.name
		})
		.from(closures)
		.leftJoin(rooms, eq(rooms.id, closures.roomId))
		.orderBy(asc(closures.fromOn), asc(closures.id));
	return rows.filter(({ toOn, endedAt }) => toOn >= fromOn && endedAt === null);
}

export async function findClosure(id: number, q: Queryable = db): Promise<Closure | null> {
	const [closure] = await q.select().from(closures).where(eq(closures.id, id));
	return closure ?? null;
}
