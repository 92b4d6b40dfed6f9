import { randomUUID } from 'node:crypto';
import { eq } from 'drizzle-orm';
import type { Queryable, Tx } from '../db';
import { slotCoaches, slots } from '../db/schema';
import { isClosedOn, type ClosedDays } from '$lib/domain/calendar/closures';
import { allowedBetween } from '../series/allowed-clashes';
import { expand, type Occurrence } from '../series/expand';
import type { SeriesWithCoaches } from '../series/queries';
import { clashesOf, type Clash, type Intended } from './clashes';
import { recordOverrides } from './overrides';

export type Range = {
	/** Civil dates, both included. */
	fromOn: string;
	toOn: string;
	/** Only starts after this instant are made: nobody is put into the past. */
	after: number;
};

/** What its slots take from a series. */
export type SeriesShape = Pick<
	SeriesWithCoaches,
	'id' | 'classTypeId' | 'roomId' | 'setPlaces' | 'coachIds'
>;

export type Made = {
	slotIds: number[];
	/** Dates left out because a room or a coach is taken; somebody decides about them. */
	clashes: Clash[];
};

/**
 * Makes the slots that a series lacks in a range. Idempotent: a slot is known by its series and
 * original local start, so what was moved, changed or called off is never made again; closed
 * days are skipped.
 */
export async function materialise(
	tx: Tx,
	series: SeriesWithCoaches,
	range: Range,
	{ zone, closed, now }: { zone: string; closed: readonly ClosedDays[]; now: number }
): Promise<Made> {
	const lacking = await lackingOf(tx, series, range, { zone, closed });
	const intended = lacking.map((occurrence) => intend(series, occurrence));
	const clashes = await clashesOf(intended, tx);
	const allowed = await allowedBetween(tx, series, clashes);
	const refused = new Set(clashes.filter((c) => !allowed.has(c)).map(({ uid }) => uid));
	for (const [clash, { why, byId }] of allowed) {
		if (!refused.has(clash.uid)) await recordOverrides(tx, [clash], { why, byId, now });
	}
	const made = intended.flatMap((slot, i) =>
		refused.has(slot.uid) ? [] : [{ ...slot, occurrence: lacking[i]! }]
	);
	const slotIds = await insertSlots(tx, series, made, now);
	return { slotIds, clashes: clashes.filter(({ uid }) => refused.has(uid)) };
}

/** The dates of the rule that have no slot yet and are not closed. A rule has one start a day at most. */
export async function lackingOf(
	q: Queryable,
	series: SeriesWithCoaches,
	{ fromOn, toOn, after }: Range,
	{ zone, closed }: { zone: string; closed: readonly ClosedDays[] }
): Promise<Occurrence[]> {
	const there = await q
		.select({ key: slots.recurrenceKey })
		.from(slots)
		.where(eq(slots.seriesId, series.id));
	const days = new Set(there.map(({ key }) => key?.slice(0, 10)));
	return expand(series, { zone, fromOn, toOn }).filter(
		({ startsOn, startsAt }) =>
			!days.has(startsOn) && startsAt > after && !isClosedOn(closed, startsOn, series.roomId)
	);
}

export function intend(series: SeriesShape, { startsAt, endsAt }: Occurrence): Intended {
	const { id, roomId, coachIds } = series;
	return { uid: randomUUID(), slotId: null, seriesId: id, roomId, coachIds, startsAt, endsAt };
}

export type Making = Intended & { occurrence: Occurrence };

/** Rows a statement: SQLite takes 32,766 values in one. */
const batch = 200;

export async function insertSlots(
	tx: Tx,
	series: SeriesShape,
	made: readonly Making[],
	now: number
): Promise<number[]> {
	const slotIds: number[] = [];
	for (let i = 0; i < made.length; i += batch) {
		const rows = await tx
			.insert(slots)
			.values(made.slice(i, i + batch).map((slot) => rowOf(series, slot, now)))
			.returning({ id: slots.id });
		slotIds.push(...rows.map(({ id }) => id));
		const coaches = rows.flatMap(({ id }) =>
			series.coachIds.map((personId, position) => ({ slotId: id, personId, position }))
		);
		if (coaches.length > 0) await tx.insert(slotCoaches).values(coaches);
	}
	return slotIds;
}

const rowOf = (series: SeriesShape, { uid, occurrence }: Making, now: number) => ({
	uid,
	seriesId: series.id,
	recurrenceKey: occurrence.key,
	classTypeId: series.classTypeId,
	roomId: series.roomId,
	startsOn: occurrence.startsOn,
	startTime: occurrence.startTime,
	startsAt: occurrence.startsAt,
	endsAt: occurrence.endsAt,
	setPlaces: series.setPlaces,
	modifiedAt: now,
	createdAt: now
});
