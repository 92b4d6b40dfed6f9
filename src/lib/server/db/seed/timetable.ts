import { createHash } from 'node:crypto';
import { instantOf, writeRule, type Weekday } from '$lib/domain/calendar';
import { addDays, weekOf, weekday } from '$lib/domain/calendar/civil-date';
import { expand, type Occurrence } from '../../series/expand';
import { horizonOn } from '../../slots/extend-horizon';
import type { Tx } from '..';
import { closures, publications, series, seriesCoaches, slotCoaches, slots } from '../schema';
import { daysBetween } from './days-between';
import { insertAll } from './insert-all';
import type { Staff } from './people';
import type { Records } from './records';
import {
	calledOffData,
	clash,
	classTypeData,
	closureData,
	isLaid,
	seriesData,
	sessionFor,
	type ClassKey,
	type SeriesData
} from './timetable-data';

export const zone = 'Europe/Dublin';
export type Rooms = { floor: number; loft: number };
export type SeedSlot = {
	id: number;
	type: ClassKey;
	startsOn: string;
	startTime: string;
	startsAt: number;
	endsAt: number;
	roomId: number;
	coachId: number;
	setPlaces: number | null;
	revisionId: number | null;
	isPublished: boolean;
	cancelledAt: number | null;
	cancelledById: number | null;
	cancelReason: string | null;
	/** Counted from this week, and from Monday. */
	week: number;
	day: number;
	isClash: boolean;
};
type Given = {
	typeIds: Record<ClassKey, number>;
	revisionIds: Map<string, number>;
	staffIds: Staff;
	roomIds: Rooms;
	records: Records;
	now: number;
	todayOn: string;
};

const weeksBack = 6;
const dayMs = 86_400_000;
const codes: Weekday[] = ['MO', 'TU', 'WE', 'TH', 'FR', 'SA', 'SU'];

/** Series from six weeks ago, their slots for 26 weeks ahead, sessions laid for five and published for two. */
export async function addTimetable(tx: Tx, given: Given): Promise<SeedSlot[]> {
	const mondayOn = weekOf(given.todayOn);
	const firstOn = addDays(mondayOn, -7 * weeksBack);
	const madeAt = instantOf(addDays(firstOn, -14), '14:00', zone);
	const closed = await addClosures(tx, given, mondayOn);

	const all: SeedSlot[] = [];
	const rows: (typeof slots.$inferInsert)[] = [];
	for (const [i, data] of seriesData.entries()) {
		const id = i + 1;
		const columns = columnsOf(data, given, firstOn);
		const createdById = given.staffIds.head;
		const coachId = given.staffIds[data.coach];
		await tx.insert(series).values({ ...columns, id, createdAt: madeAt, createdById });
		await tx.insert(seriesCoaches).values({ seriesId: id, personId: coachId });
		const range = { zone, fromOn: columns.startsOn, toOn: horizonOn(given.todayOn) };
		const dates = expand(columns, range).filter(
			({ startsOn }) => !closed.has(`${data.room} ${startsOn}`)
		);
		for (const date of dates) {
			const slot = slotOf(date, data, { ...given, mondayOn, id: all.length + 1, coachId });
			all.push(slot);
			rows.push(rowOf(slot, date, { ...columns, seriesId: id }, given, madeAt));
		}
		const detail = { ...columns, coachIds: [coachId], slots: dates.length, clashes: 0 };
		const fact = { verb: 'series.add', noun: 'series', nounId: id };
		given.records.audit({ ...fact, at: madeAt + i * 240_000, byId: createdById, detail });
	}
	await insertAll(tx, slots, rows);
	await insertAll(
		tx,
		slotCoaches,
		all.map(({ id, coachId }) => ({ slotId: id, personId: coachId }))
	);
	await addPublications(tx, all, given, mondayOn);
	return all.sort((a, b) => a.startsAt - b.startsAt || a.id - b.id);
}

function columnsOf(
	{ type, room, time, days, setPlaces }: SeriesData,
	{ typeIds, roomIds }: Given,
	firstOn: string
) {
	const rule = writeRule({ unit: 'week', every: 1, days });
	if (!rule.ok) throw new Error(`no rule for ${days}`);
	return {
		classTypeId: typeIds[type],
		roomId: roomIds[room],
		startsOn: addDays(firstOn, codes.indexOf(days[0]!)),
		startTime: time,
		lengthMin: classTypeData.find(({ key }) => key === type)!.lengthMin,
		rule: rule.text,
		setPlaces: setPlaces ?? null
	};
}

function slotOf(
	{ startsOn, startTime, startsAt, endsAt }: Occurrence,
	{ type, room, setPlaces }: SeriesData,
	given: Given & { mondayOn: string; id: number; coachId: number }
): SeedSlot {
	const { id, coachId, now, mondayOn, staffIds } = given;
	const week = daysBetween(mondayOn, weekOf(startsOn)) / 7;
	const day = weekday(startsOn) - 1;
	const isClash = week === 1 && day === clash.day && startTime === clash.time;
	const title = isClash ? clash.session : sessionFor(type, day, week);
	const off = calledOffData.find((o) => o.week === week && o.day === day && o.time === startTime);
	const cancelledAt = off ? Math.min(now - 3_600_000, startsAt - 20 * 3_600_000) : null;
	return {
		id,
		type,
		startsOn,
		startTime,
		startsAt,
		endsAt,
		roomId: given.roomIds[room],
		coachId,
		setPlaces: setPlaces ?? null,
		revisionId: isLaid(day, week) ? given.revisionIds.get(title)! : null,
		isPublished: week <= 1,
		cancelledAt,
		cancelledById: off ? staffIds.head : null,
		cancelReason: off?.why ?? null,
		week,
		day,
		isClash
	};
}

function rowOf(
	slot: SeedSlot,
	{ key }: Occurrence,
	{ seriesId, classTypeId }: { seriesId: number; classTypeId: number },
	{ now, todayOn }: Given,
	createdAt: number
): typeof slots.$inferInsert {
	const mondayOn = addDays(slot.startsOn, -slot.day);
	const { laidAt, publishedAt } = deskWork(mondayOn, now);
	const sessionPublishedAt = slot.isPublished && slot.revisionId !== null ? publishedAt : null;
	return {
		id: slot.id,
		uid: uidOf(`${todayOn} ${seriesId} ${key}`),
		seriesId,
		recurrenceKey: key,
		classTypeId,
		roomId: slot.roomId,
		startsOn: slot.startsOn,
		startTime: slot.startTime,
		startsAt: slot.startsAt,
		endsAt: slot.endsAt,
		setPlaces: slot.setPlaces,
		sessionRevisionId: slot.revisionId,
		laidAt: slot.revisionId === null ? null : laidAt,
		sessionPublishedAt,
		cancelledAt: slot.cancelledAt,
		cancelledById: slot.cancelledById,
		cancelReason: slot.cancelReason,
		sequence: slot.cancelledAt === null ? 0 : 1,
		modifiedAt: slot.cancelledAt ?? sessionPublishedAt ?? createdAt,
		createdAt
	};
}

/** When the head coach laid a week and showed it: well before it, and before now. */
function deskWork(mondayOn: string, now: number): { laidAt: number; publishedAt: number } {
	const at = (daysBefore: number, time: string, latest: number) =>
		Math.min(instantOf(addDays(mondayOn, -daysBefore), time, zone), latest);
	return {
		laidAt: at(12, '13:40', now - 30 * 3_600_000),
		publishedAt: at(3, '16:05', now - 26 * 3_600_000)
	};
}

async function addClosures(tx: Tx, { roomIds, staffIds, records, now }: Given, mondayOn: string) {
	const shut = new Set<string>();
	for (const [i, { room, week, day, why }] of closureData.entries()) {
		const on = addDays(mondayOn, week * 7 + day);
		const createdAt = now - 20 * dayMs;
		const row = { roomId: roomIds[room], fromOn: on, toOn: on, why };
		await tx.insert(closures).values({ ...row, id: i + 1, createdAt, createdById: staffIds.owner });
		const detail = { ...row, calledOff: 0, released: 0 };
		const fact = { verb: 'closures.close', noun: 'closures', nounId: i + 1 };
		records.audit({ ...fact, at: createdAt, byId: staffIds.owner, detail });
		shut.add(`${room} ${on}`);
	}
	return shut;
}

async function addPublications(
	tx: Tx,
	all: SeedSlot[],
	{ staffIds, records, now }: Given,
	mondayOn: string
): Promise<void> {
	const byId = staffIds.head;
	for (let week = -weeksBack; week <= 4; week += 1) {
		const weekOn = addDays(mondayOn, week * 7);
		const laid = all.filter((slot) => slot.week === week && slot.revisionId !== null);
		const { laidAt, publishedAt } = deskWork(weekOn, now);
		const slotIds = laid.map(({ id }) => id);
		records.audit({ at: laidAt, byId, verb: 'slots.lay', noun: 'slots', detail: { slotIds } });
		if (week > 1) continue;
		const [row] = await tx
			.insert(publications)
			.values({ weekOn, at: publishedAt, byId, slots: laid.length })
			.returning({ id: publications.id });
		const fact = { verb: 'weeks.publish', noun: 'publications', nounId: row!.id };
		records.audit({ ...fact, at: publishedAt, byId, detail: { weekOn, slots: laid.length } });
	}
}

/** The same opaque name for the same slot of the same day's demo. */
const uidOf = (slot: string): string =>
	createHash('sha256').update(slot).digest('hex').slice(0, 32);
