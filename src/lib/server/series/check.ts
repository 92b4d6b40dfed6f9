import { and, eq, inArray, isNull } from 'drizzle-orm';
import { capabilitiesOf, roles } from '$lib/domain/people/capabilities';
import { refuse, type Refused } from '$lib/domain/refusal';
import { db, type Queryable } from '../db';
import { classTypes, people, personRoles, rooms } from '../db/schema';

type Asked = { classTypeId: number; roomId: number; coachIds: readonly number[] };

/** Whether class type, room and coaches are there and in use; null where they are. */
export async function missingFrom(
	{ classTypeId, roomId, coachIds }: Asked,
	q: Queryable = db
): Promise<Refused<'unknown-class-type' | 'unknown-room' | 'unknown-coach'> | null> {
	const [type] = await q
		.select({ id: classTypes.id })
		.from(classTypes)
		.where(and(eq(classTypes.id, classTypeId), isNull(classTypes.archivedAt)));
	if (!type) return refuse('unknown-class-type');
	const [room] = await q
		.select({ id: rooms.id })
		.from(rooms)
		.where(and(eq(rooms.id, roomId), isNull(rooms.archivedAt)));
	if (!room) return refuse('unknown-room');
	const known = new Set((await listCoaches(q)).map(({ id }) => id));
	return coachIds.every((id) => known.has(id)) ? null : refuse('unknown-coach');
}

/** People who may coach, by name. */
export async function listCoaches(q: Queryable = db): Promise<{ id: number; name: string }[]> {
	return q
		.selectDistinct({ id: people.id, name: people.name })
		.from(people)
		.innerJoin(personRoles, eq(personRoles.personId, people.id))
		.where(and(inArray(personRoles.role, coachingRoles), isNull(people.disabledAt)))
		.orderBy(people.name);
}

const coachingRoles = roles.filter((role) => capabilitiesOf([role]).has('floor:read-own'));
