import { asc, isNull } from 'drizzle-orm';
import { db, type Queryable } from '../db';
import { classTypes, rooms } from '../db/schema';
import { listCoaches } from './check';

/** What the forms of a series and of a slot choose from. */
export type StandChoices = {
	classTypes: { id: number; name: string; lengthMin: number }[];
	rooms: { id: number; name: string; places: number }[];
	coaches: { id: number; name: string }[];
};

export async function standChoices(q: Queryable = db): Promise<StandChoices> {
	const [types, halls, coaches] = await Promise.all([
		q
			.select({ id: classTypes.id, name: classTypes.name, lengthMin: classTypes.lengthMin })
			.from(classTypes)
			.where(isNull(classTypes.archivedAt))
			.orderBy(asc(classTypes.name)),
		q
			.select({ id: rooms.id, name: rooms.name, places: rooms.places })
			.from(rooms)
			.where(isNull(rooms.archivedAt))
			.orderBy(asc(rooms.position), asc(rooms.id)),
		listCoaches(q)
	]);
	return { classTypes: types, rooms: halls, coaches };
}
