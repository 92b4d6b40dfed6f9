import { eq, inArray, sql } from 'drizzle-orm';
import { reshape, type Reshaped } from '$lib/domain/calendar/reshape';
import { isClosedOn } from '$lib/domain/calendar/closures';
import type { Refused } from '$lib/domain/refusal';
import { findClassType } from '../class-types/queries';
import { closedDays } from '../closures/queries';
import type { Tx } from '../db';
import { slots } from '../db/schema';
import type { Viewer } from '../guard';
import type { Gym } from '../gym/queries';
import * as m from '$lib/wording/compiled/messages';
import { findRoom } from '../rooms/queries';
import { affectedBy, type AffectedSlot, type Becomes } from '../slots/affected';
import { callOffSlots } from '../slots/call-off';
import { clashesOf, type Clash } from '../slots/clashes';
import { horizonOn } from '../slots/extend-horizon';
import { refusedForKit } from '../slots/kit-check';
import { loadSlotsOfSeries, type SlotWithCoaches } from '../slots/load';
import { insertSlots, intend, type Making, type SeriesShape } from '../slots/materialise';
import { moveSlots } from '../slots/move';
import { promoteWaiting } from '../slots/promote-waiting';
import { tellPeople } from '../slots/tell';
import { expand, type Occurrence } from './expand';
import type { SeriesWithCoaches } from './queries';
import type { SeriesColumns } from './read-draft';

type Ask = {
	before: SeriesWithCoaches;
	columns: SeriesColumns;
	coachIds: number[];
	fromOn: string;
	todayOn: string;
	includeChanged: boolean;
	gym: Gym;
	now: number;
};

export type ReshapePlan = {
	shape: SeriesShape;
	reshaped: Reshaped<Occurrence>;
	making: Making[];
	affected: AffectedSlot[];
	clashes: Clash[];
	/** Kit that people who hold a place would lose. */
	short: Refused<'kit-short'> | null;
	/** The new rule has no date up to the horizon. */
	becomesEmpty: boolean;
};

/** Works out what an edit does to the slots ahead, who counts on them and what clashes. Writes nothing. */
export async function planReshape(
	tx: Tx,
	{ before, columns, coachIds, fromOn, todayOn, includeChanged, gym, now }: Ask
): Promise<ReshapePlan> {
	const all = await loadSlotsOfSeries(before.id, tx);
	const ahead = all.filter((s) => dayOf(s) >= fromOn && s.startsAt > now);
	const ranOn = new Set(all.filter((s) => s.startsAt <= now).map(dayOf));
	const closed = await closedDays(tx);
	const wanted = expand(columns, { zone: gym.zone, fromOn, toOn: horizonOn(todayOn) }).filter(
		({ startsOn, startsAt }) =>
			startsAt > now && !ranOn.has(startsOn) && !isClosedOn(closed, startsOn, columns.roomId)
	);
	const reshaped = reshape(ahead.map(existingOf), wanted, { includeChanged });
	const shape = { ...columns, id: before.id, coachIds };
	const making = reshaped.add.map((date) => ({ ...intend(shape, date), occurrence: date }));
	const byId = new Map(ahead.map((slot) => [slot.id, slot]));
	const moved = reshaped.change.flatMap(({ slotId, wanted: date }) => {
		const { startsAt, endsAt } = date;
		const slot = byId.get(slotId);
		return slot ? [{ ...slot, slotId, startsAt, endsAt, roomId: columns.roomId, coachIds }] : [];
	});
	const calledOff = new Set(reshaped.callOff);
	const clashes = (await clashesOf([...moved, ...making], tx)).filter(
		({ other }) => !calledOff.has(other.slotId)
	);
	const room = (await findRoom(columns.roomId, tx))?.name ?? '';
	const changes = [
		...moved.flatMap((to) => changeOf(byId.get(to.slotId), to, room)),
		...reshaped.callOff.map((slotId) => ({ slotId, becomes: { what: 'called-off' } as Becomes }))
	];
	const affected = await affectedBy(changes, tx);
	const short = await shortOnceMoved(tx, moved, byId, columns);
	const becomesEmpty = wanted.length === 0;
	return { shape, reshaped, making, affected, clashes, short, becomesEmpty };
}

type MovedSlot = { slotId: number; startsAt: number; endsAt: number; roomId: number };

async function shortOnceMoved(
	tx: Tx,
	moved: readonly MovedSlot[],
	byId: ReadonlyMap<number, SlotWithCoaches>,
	{ classTypeId }: SeriesColumns
): Promise<Refused<'kit-short'> | null> {
	const defaultClaims = (await findClassType(classTypeId, tx))?.defaultClaims ?? [];
	const revised = new Map(
		moved.map(({ slotId, startsAt, endsAt, roomId }) => [
			slotId,
			{ startsAt, endsAt, roomId, defaultClaims }
		])
	);
	const all = [...moved, ...moved.flatMap(({ slotId }) => byId.get(slotId) ?? [])];
	const fromAt = Math.min(...all.map(({ startsAt }) => startsAt));
	const toAt = Math.max(...all.map(({ endsAt }) => endsAt));
	return refusedForKit(revised, { fromAt, toAt }, tx);
}

const dayOf = ({ recurrenceKey, startsOn }: SlotWithCoaches) =>
	recurrenceKey?.slice(0, 10) ?? startsOn;

const existingOf = (slot: SlotWithCoaches) => ({
	slotId: slot.id,
	key: slot.recurrenceKey ?? '',
	isCalledOff: slot.cancelledAt !== null,
	isChanged: slot.changedAt !== null
});

/** What people on a slot notice of its move; nothing where it stands as it stood. */
function changeOf(
	before: SlotWithCoaches | undefined,
	to: { slotId: number; startsAt: number; endsAt: number; roomId: number; coachIds: number[] },
	roomName: string
): { slotId: number; becomes: Becomes }[] {
	if (!before) return [];
	const { slotId, startsAt, endsAt } = to;
	const room = before.roomId === to.roomId ? null : roomName;
	const coaches = before.coachIds.join() !== to.coachIds.join();
	const stays = before.startsAt === startsAt && before.endsAt === endsAt && !room && !coaches;
	return stays ? [] : [{ slotId, becomes: { what: 'changed', startsAt, endsAt, room, coaches } }];
}

/**
 * Makes a plan come true for the series that the slots belong to from now on. Slots of days that
 * fell out are called off and let go, so that a later edit may make those days anew.
 */
export async function applyReshape(
	tx: Tx,
	viewer: Viewer,
	{ shape, reshaped, making, affected }: ReshapePlan,
	{ seriesId, gym, now }: { seriesId: number; gym: Gym; now: number }
): Promise<{ changed: number; calledOff: number; added: number; released: number }> {
	const after = { ...shape, id: seriesId };
	const fact = `series:${seriesId}:reshaped:${now}`;
	const off = new Set(reshaped.callOff);
	const why = m.plan_timetable_changed();
	const released = await callOffSlots(
		tx,
		viewer,
		affected.filter(({ slotId }) => off.has(slotId)),
		{ gym, why, fact: `${fact}:off`, now }
	);
	await letGo(tx, [...reshaped.callOff, ...reshaped.letGo], why);
	for (const { slotId, wanted } of reshaped.keep) {
		await tx.update(slots).set({ seriesId, recurrenceKey: wanted.key }).where(eq(slots.id, slotId));
	}
	const moves = reshaped.change.map(({ slotId, wanted }) => ({
		slotId,
		columns: { ...columnsOf(after, wanted), changedAt: null },
		coachIds: after.coachIds
	}));
	await moveSlots(tx, moves, now);
	await insertSlots(tx, after, making, now);
	const moved = moves.map(({ slotId }) => slotId);
	await promoteWaiting(tx, moved, { viewer, now });
	const told = affected.filter(({ slotId }) => !off.has(slotId));
	await tellPeople(tx, told, { gym, why: null, fact, now });
	return {
		changed: moves.length,
		calledOff: off.size,
		added: making.length,
		released
	};
}

/** What a closure had called off is called off by the timetable now: opening again leaves it off. */
async function letGo(tx: Tx, slotIds: number[], why: string): Promise<void> {
	const cancelReason = sql<string>`case when ${slots.cancelledAt} is null then ${slots.cancelReason} else ${why} end`;
	await tx
		.update(slots)
		.set({ seriesId: null, recurrenceKey: null, cancelReason })
		.where(inArray(slots.id, slotIds));
}

const columnsOf = (
	shape: SeriesShape,
	{ key, startsOn, startTime, startsAt, endsAt }: Occurrence
) => ({
	seriesId: shape.id,
	recurrenceKey: key,
	classTypeId: shape.classTypeId,
	roomId: shape.roomId,
	setPlaces: shape.setPlaces,
	startsOn,
	startTime,
	startsAt,
	endsAt
});
