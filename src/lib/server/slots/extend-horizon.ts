import { eq } from 'drizzle-orm';
import { addDays } from '$lib/domain/calendar/civil-date';
import { localOf } from '$lib/domain/calendar/zone';
import { audit } from '../audit/record';
import { closedDays } from '../closures/queries';
import { write, type Tx } from '../db';
import { series } from '../db/schema';
import { currentGym } from '../gym/queries';
import { expand } from '../series/expand';
import { findSeries, liveSeriesIds, type SeriesWithCoaches } from '../series/queries';
import { materialise } from './materialise';

/** Slots exist this far ahead: 26 weeks. */
export const horizonDays = 182;

export const horizonOn = (todayOn: string): string => addDays(todayOn, horizonDays);

/**
 * Makes what every live series lacks up to the horizon; run daily. One write a series, so that
 * bookings need not wait for all of them.
 * @returns how many slots were made, and how many dates were left out for a clash
 */
export async function extendHorizon({ now }: { now: number }): Promise<{
	made: number;
	leftOut: number;
}> {
	const total = { made: 0, leftOut: 0 };
	const gym = await currentGym();
	if (!gym) return total;
	const todayOn = localOf(now, gym.zone).on;
	const range = { fromOn: todayOn, toOn: horizonOn(todayOn), after: now };
	for (const id of await liveSeriesIds(now)) {
		const { slotIds, clashes } = await write(async (tx) => {
			const one = await findSeries(id, tx);
			if (!one) return { slotIds: [], clashes: [] };
			if (isOver(one, todayOn, gym.zone)) await markOver(tx, one, now);
			const closed = await closedDays(tx);
			return materialise(tx, one, range, { zone: gym.zone, closed, now });
		});
		total.made += slotIds.length;
		total.leftOut += clashes.length;
	}
	return total;
}

/** The longest step of a rule is 52 months. */
const longestStepDays = 52 * 31;

const isOver = (one: SeriesWithCoaches, fromOn: string, zone: string): boolean =>
	expand(one, { zone, fromOn, toOn: addDays(fromOn, longestStepDays), atMost: 1 }).length === 0;

/** A series whose last date has passed keeps neither its room nor its class type in use. */
async function markOver(tx: Tx, { id }: SeriesWithCoaches, now: number): Promise<void> {
	await tx.update(series).set({ endedAt: now }).where(eq(series.id, id));
	await audit(tx, { viewer: null, verb: 'series.over', noun: 'series', nounId: id, now });
}
