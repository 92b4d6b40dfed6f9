import { localOf } from '$lib/domain/calendar/zone';
import { closedDays } from '../closures/queries';
import { db, type Queryable } from '../db';
import type { Gym } from '../gym/queries';
import { clashesOf, type Clash } from '../slots/clashes';
import { horizonOn } from '../slots/extend-horizon';
import { intend, lackingOf } from '../slots/materialise';
import { findSeries } from './queries';

/** Dates of a series up to the horizon that have no slot, and what stands in their way. */
export async function leftOutOf(
	seriesId: number,
	{ gym, now }: { gym: Gym; now: number },
	q: Queryable = db
): Promise<Clash[]> {
	const one = await findSeries(seriesId, q);
	if (!one || (one.endedAt !== null && one.endedAt <= now)) return [];
	const todayOn = localOf(now, gym.zone).on;
	const range = { fromOn: todayOn, toOn: horizonOn(todayOn), after: now };
	const closed = await closedDays(q);
	const lacking = await lackingOf(q, one, range, { zone: gym.zone, closed });
	return clashesOf(
		lacking.map((date) => intend(one, date)),
		q
	);
}
