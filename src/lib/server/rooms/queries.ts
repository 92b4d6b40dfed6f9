import { and, asc, count, eq, gt, isNull, or } from 'drizzle-orm';
import { db, type Queryable } from '../db';
import { rooms, series, slots } from '../db/schema';

/** A room and what hangs on it: series that go on and slots ahead. */
export type RoomRow = {
	id: number;
	name: string;
	/** The posted limit: everyone in the room, coaches too. */
	places: number;
	archivedAt: number | null;
	series: number;
	slotsAhead: number;
};

/** Every room, archived ones last, in the gym's own order. */
export async function listRooms(now: number, q: Queryable = db): Promise<RoomRow[]> {
	const all = await q.select().from(rooms).orderBy(asc(rooms.position), asc(rooms.id));
	const ofSeries = await q
		.select({ roomId: series.roomId, n: count() })
		.from(series)
		.where(or(isNull(series.endedAt), gt(series.endedAt, now)))
		.groupBy(series.roomId);
	const ahead = await q
		.select({ roomId: slots.roomId, n: count() })
		.from(slots)
		.where(and(gt(slots.startsAt, now), isNull(slots.cancelledAt)))
		.groupBy(slots.roomId);
	const numberOf = (rows: { roomId: number; n: number }[], id: number) =>
		rows.find(({ roomId }) => roomId === id)?.n ?? 0;
	return all
		.map(({ id, name, places, archivedAt }) => ({
			id,
			name,
			places,
			archivedAt,
			series: numberOf(ofSeries, id),
			slotsAhead: numberOf(ahead, id)
		}))
		.sort((x, y) => Number(x.archivedAt !== null) - Number(y.archivedAt !== null));
}

export type Room = typeof rooms.$inferSelect;

export async function findRoom(id: number, q: Queryable = db): Promise<Room | null> {
	const [room] = await q.select().from(rooms).where(eq(rooms.id, id));
	return room ?? null;
}

/** Whether another room has this name; a room may keep its own. */
export async function isRoomNameTaken(
	name: string,
	except: number | null,
	q: Queryable = db
): Promise<boolean> {
	const all = await q.select({ id: rooms.id, name: rooms.name }).from(rooms);
	return all.some((room) => room.id !== except && room.name.toLowerCase() === name.toLowerCase());
}
