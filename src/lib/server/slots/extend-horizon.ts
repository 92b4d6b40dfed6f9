import { addDays } from '$lib/domain/calendar/civil-date';
import { localOf } from '$lib/domain/calendar/zone';
import { closedDays } from '../closures/queries';
import { write } from '../db';
import { currentGym } from '../gym/queries';
import { findSeries, liveSeriesIds } from '../series/queries';
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
	for (const id of await liveSeriesIds()) {
		const { slotIds, clashes } = await write(async (tx) => {
			const series = await findSeries(id, tx);
			if (!series || series.endedAt !== null) return { slotIds: [], clashes: [] };
			const closed = await closedDays(tx);
			return materialise(tx, series, range, { zone: gym.zone, closed, now });
		});
		total.made += slotIds.length;
		total.leftOut += clashes.length;
	}
	return total;
}
