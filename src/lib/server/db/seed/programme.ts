import type { SessionContent } from '$lib/domain/training';
import type { Tx } from '..';
import { classTypes, programmes, rooms, sessionRevisions, trainingSessions } from '../schema';
import { groups, type GroupKey } from './kit-data';
import type { SeededLibrary } from './library';
import { build } from './session-builder';
import { sessionData } from './session-data';
import { classTypeData, type ClassKey } from './timetable-data';

/** Posted limits: everybody in the room. */
export const roomPlaces = { floor: 18, loft: 10 };

export async function addRooms(tx: Tx, now: number) {
	const add = async (name: string, places: number, position: number) =>
		(
			await tx
				.insert(rooms)
				.values({ name, places, position, createdAt: now })
				.returning({ id: rooms.id })
		)[0]!.id;
	return {
		floor: await add('Long Floor', roomPlaces.floor, 0),
		loft: await add('Loft', roomPlaces.loft, 1)
	};
}

/** Programmes and the sessions of each, one revision a session. Returns revision ids by title, and contents by id. */
export async function addSessions(tx: Tx, library: SeededLibrary, headId: number, now: number) {
	const programmeIds: Record<string, number> = {};
	const aims = {
		Strength: 'Load, in small numbers',
		Engine: 'Breath, for longer',
		'Minimal kit': 'What the floor alone can do'
	};
	for (const [position, [name, aim]] of Object.entries(aims).entries()) {
		const [row] = await tx
			.insert(programmes)
			.values({ name, aim, position, createdAt: now })
			.returning({ id: programmes.id });
		programmeIds[name] = row!.id;
	}
	const revisionIds = new Map<string, number>();
	const contents = new Map<number, SessionContent>();
	for (const draft of sessionData) {
		const { title, lengthMin, programme } = draft;
		const [session] = await tx
			.insert(trainingSessions)
			.values({
				title,
				lengthMin,
				programmeId: programmeIds[programme],
				revisionNumber: 1,
				createdAt: now,
				createdById: headId
			})
			.returning({ id: trainingSessions.id });
		const content = build(draft, library);
		const [revision] = await tx
			.insert(sessionRevisions)
			.values({
				trainingSessionId: session!.id,
				number: 1,
				content,
				createdAt: now,
				createdById: headId
			})
			.returning({ id: sessionRevisions.id });
		revisionIds.set(title, revision!.id);
		contents.set(revision!.id, content);
	}
	return { programmeIds, revisionIds, contents };
}

export async function addClassTypes(
	tx: Tx,
	programmeIds: Record<string, number>,
	groupIds: Record<GroupKey, number>,
	now: number
) {
	const ids = {} as Record<ClassKey, number>;
	for (const { key, programme, claims, ...type } of classTypeData) {
		const defaultClaims = claims.map(({ group, quantity }) => ({
			kitGroupId: groupIds[group as keyof typeof groups],
			quantity,
			peoplePerPiece: 1
		}));
		const [row] = await tx
			.insert(classTypes)
			.values({ ...type, programmeId: programmeIds[programme], defaultClaims, createdAt: now })
			.returning({ id: classTypes.id });
		ids[key] = row!.id;
	}
	return ids;
}
