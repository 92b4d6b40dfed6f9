import { createHash } from 'node:crypto';
import { writeRule, type Weekday } from '$lib/domain/calendar';
import { addDays, weekOf, weekday } from '$lib/domain/calendar/civil-date';
import { expand } from '../../series/expand';
import type { Tx } from '..';
import {
	classTypes,
	programmes,
	publications,
	rooms,
	series,
	seriesCoaches,
	sessionRevisions,
	slotCoaches,
	slots,
	trainingSessions
} from '../schema';
import { groups, type GroupKey } from './kit-data';
import type { SeededLibrary } from './library';
import { build } from './session-builder';
import { sessionData } from './session-data';
import { clash, classTypeData, seriesData, sessionFor, type ClassKey } from './timetable-data';

export const zone = 'Europe/Dublin';
export type SeedSlot = {
	id: number;
	startsOn: string;
	startsAt: number;
	endsAt: number;
	roomId: number;
	type: ClassKey;
	week: number;
};
type When = { now: number; todayOn: string };
type Staff = { staffIds: Record<string, number>; roomIds: { floor: number; loft: number } };

export async function addRooms(tx: Tx, now: number) {
	const add = async (name: string, places: number, position: number) =>
		(
			await tx
				.insert(rooms)
				.values({ name, places, position, createdAt: now })
				.returning({ id: rooms.id })
		)[0]!.id;
	return { floor: await add('Long Floor', 18, 0), loft: await add('Loft', 10, 1) };
}

/** Programmes and the sessions of each, one revision a session. Returns revision ids by title. */
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
		const [revision] = await tx
			.insert(sessionRevisions)
			.values({
				trainingSessionId: session!.id,
				number: 1,
				content: build(draft, library),
				createdAt: now,
				createdById: headId
			})
			.returning({ id: sessionRevisions.id });
		revisionIds.set(title, revision!.id);
	}
	return { programmeIds, revisionIds };
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

/** Series from six weeks ago, their slots for 26 weeks ahead, sessions laid for five and published for two. */
export async function addTimetable(
	tx: Tx,
	typeIds: Record<ClassKey, number>,
	{ staffIds, roomIds }: Staff,
	revisionIds: Map<string, number>,
	{ now, todayOn }: When
): Promise<SeedSlot[]> {
	const mondayOn = weekOf(todayOn);
	const firstOn = addDays(mondayOn, -42);
	const all: SeedSlot[] = [];
	for (const { type, room, coach, time, days } of seriesData) {
		const startsOn = addDays(firstOn, ['MO', 'TU', 'WE', 'TH', 'FR', 'SA', 'SU'].indexOf(days[0]!));
		const lengthMin = classTypeData.find(({ key }) => key === type)!.lengthMin;
		const columns = {
			classTypeId: typeIds[type],
			roomId: roomIds[room],
			startsOn,
			startTime: time,
			lengthMin,
			rule: weekly(days)
		};
		const [row] = await tx
			.insert(series)
			.values({ ...columns, createdAt: now, createdById: staffIds.head })
			.returning({ id: series.id });
		const personId = staffIds[coach]!;
		await tx.insert(seriesCoaches).values({ seriesId: row!.id, personId });
		const dates = expand(columns, { zone, fromOn: startsOn, toOn: addDays(todayOn, 182) });
		const laid = dates.map((date) => {
			const week = Math.round(
				(Date.parse(weekOf(date.startsOn)) - Date.parse(mondayOn)) / 604_800_000
			);
			const day = weekday(date.startsOn) - 1;
			const isClash = week === 1 && day === clash.day && time === clash.time;
			const title = isClash ? clash.session : sessionFor(type, day, week);
			const sessionRevisionId = week <= 4 ? revisionIds.get(title)! : null;
			return { date, week, sessionRevisionId };
		});
		const rows = await tx
			.insert(slots)
			.values(
				laid.map(({ date, week, sessionRevisionId }) => ({
					uid: uidOf(`${todayOn} ${row!.id} ${date.key}`),
					seriesId: row!.id,
					recurrenceKey: date.key,
					classTypeId: columns.classTypeId,
					roomId: columns.roomId,
					startsOn: date.startsOn,
					startTime: date.startTime,
					startsAt: date.startsAt,
					endsAt: date.endsAt,
					sessionRevisionId,
					laidAt: sessionRevisionId === null ? null : now,
					sessionPublishedAt: sessionRevisionId !== null && week <= 1 ? now : null,
					modifiedAt: now,
					createdAt: now
				}))
			)
			.returning({ id: slots.id });
		await tx.insert(slotCoaches).values(rows.map(({ id }) => ({ slotId: id, personId })));
		all.push(
			...rows.map(({ id }, i) => ({
				id,
				...laid[i]!.date,
				week: laid[i]!.week,
				roomId: columns.roomId,
				type
			}))
		);
	}
	for (const week of [0, 1]) {
		const count = all.filter((slot) => slot.week === week).length;
		await tx
			.insert(publications)
			.values({ weekOn: addDays(mondayOn, week * 7), at: now, byId: staffIds.head!, slots: count });
	}
	return all.sort((a, b) => a.startsAt - b.startsAt || a.id - b.id);
}

function weekly(days: Weekday[]): string {
	const rule = writeRule({ unit: 'week', every: 1, days });
	if (!rule.ok) throw new Error(`no rule for ${days}`);
	return rule.text;
}

/** The same opaque name for the same slot of the same day's demo. */
const uidOf = (slot: string): string =>
	createHash('sha256').update(slot).digest('hex').slice(0, 32);
