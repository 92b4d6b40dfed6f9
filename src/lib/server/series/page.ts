import { localOf } from '$lib/domain/calendar/zone';
import { pickedFrom } from '$lib/domain/calendar/picked-rule';
import type { PickedDates } from '$lib/domain/calendar/next-dates';
import { findClassType } from '../class-types/queries';
import { db, type Queryable } from '../db';
import type { Gym } from '../gym/queries';
import type { Clash } from '../slots/clashes';
import { loadSlotsOfSeries } from '../slots/load';
import { leftOutOf } from './left-out';
import { findSeries } from './queries';

/** A series as its page edits it. */
export type SeriesPage = {
	id: number;
	title: string;
	classTypeId: number;
	roomId: number;
	coachIds: number[];
	setPlaces: number | null;
	version: number;
	isOver: boolean;
	picked: PickedDates;
	/** Days ahead with a slot: where "this and following" may begin. */
	daysAhead: string[];
	/** Slots ahead that were changed by hand. */
	changedByHand: { slotId: number; startsOn: string; startsAt: number }[];
	/** Dates that were not made, as room or coach is taken. */
	leftOut: Clash[];
};

export async function seriesPage(
	id: number,
	{ gym, now }: { gym: Gym; now: number },
	q: Queryable = db
): Promise<SeriesPage | null> {
	const one = await findSeries(id, q);
	if (!one) return null;
	const [type, slots, leftOut] = await Promise.all([
		findClassType(one.classTypeId, q),
		loadSlotsOfSeries(id, q),
		leftOutOf(id, { gym, now }, q)
	]);
	const ahead = slots.filter(({ startsAt, cancelledAt }) => startsAt > now && cancelledAt === null);
	const { startsOn, startTime, lengthMin, rule } = one;
	return {
		id,
		title: type?.name ?? '',
		classTypeId: one.classTypeId,
		roomId: one.roomId,
		coachIds: one.coachIds,
		setPlaces: one.setPlaces,
		version: one.version,
		isOver: one.endedAt !== null && localOf(one.endedAt, gym.zone).on <= localOf(now, gym.zone).on,
		picked: { ...pickedFrom(rule, startsOn, gym.weekStartsOn), startsOn, startTime, lengthMin },
		daysAhead: ahead.map(({ recurrenceKey }) => recurrenceKey?.slice(0, 10) ?? ''),
		changedByHand: ahead
			.filter(({ changedAt }) => changedAt !== null)
			.map((slot) => ({ slotId: slot.id, startsOn: slot.startsOn, startsAt: slot.startsAt })),
		leftOut
	};
}
