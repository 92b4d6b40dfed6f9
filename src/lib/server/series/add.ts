import { localOf } from '$lib/domain/calendar/zone';
import { refuse, type Refused } from '$lib/domain/refusal';
import type { SeriesDraft } from '$lib/forms/series';
import { audit } from '../audit/record';
import { isClosedOn } from '$lib/domain/calendar/closures';
import { closedDays } from '../closures/queries';
import { write } from '../db';
import type { Viewer } from '../guard';
import { currentGym } from '../gym/queries';
import { clashesOf } from '../slots/clashes';
import { horizonOn } from '../slots/extend-horizon';
import { insertSlots, intend } from '../slots/materialise';
import { lookFirst, type Confirmed, type LookFirst } from '../slots/look';
import { recordOverrides } from '../slots/overrides';
import { withAllowed } from './allowed-clashes';
import { expand } from './expand';
import { readSeriesDraft, type DraftRefusal } from './read-draft';
import { insertSeries } from './rows';

export type AddSeriesRefusal =
	DraftRefusal | LookFirst | Refused<'no-gym' | 'starts-in-the-past' | 'no-dates'>;

/**
 * Starts a recurring class and makes its slots up to the horizon. Where a room or a coach is
 * taken, the clashes are shown first and want a reason, which later dates go by too.
 */
export async function addSeries(
	viewer: Viewer,
	draft: SeriesDraft,
	{ now, ...confirmed }: Confirmed & { now: number }
): Promise<{ ok: true; seriesId: number; slots: number } | AddSeriesRefusal> {
	return write(async (tx) => {
		const gym = await currentGym(tx);
		if (!gym) return refuse('no-gym');
		const todayOn = localOf(now, gym.zone).on;
		if (draft.startsOn < todayOn) return refuse('starts-in-the-past');
		const read = await readSeriesDraft(draft, gym, tx);
		if (!read.ok) return read;

		const { columns, coachIds } = read;
		const closed = await closedDays(tx);
		const toOn = laterOf(horizonOn(todayOn), draft.startsOn);
		const dates = expand(columns, { zone: gym.zone, fromOn: draft.startsOn, toOn })
			.filter(({ startsAt }) => startsAt > now)
			.filter(({ startsOn }) => !isClosedOn(closed, startsOn, columns.roomId));
		if (dates.length === 0) return refuse('no-dates');

		const shape = { ...columns, id: 0, coachIds };
		const making = dates.map((occurrence) => ({ ...intend(shape, occurrence), occurrence }));
		const clashes = await clashesOf(making, tx);
		const look = lookFirst([], clashes, confirmed);
		if (look) return look;

		const by = { why: confirmed.overrideWhy ?? '', byId: viewer.personId };
		const seriesId = await insertSeries(tx, columns, coachIds, {
			clashesAllowed: withAllowed([], clashes, by),
			createdAt: now,
			createdById: viewer.personId
		});
		await recordOverrides(tx, clashes, { ...by, now });
		const made = await insertSlots(tx, { ...shape, id: seriesId }, making, now);
		await audit(tx, {
			viewer,
			verb: 'series.add',
			noun: 'series',
			nounId: seriesId,
			now,
			detail: { ...columns, coachIds, slots: made.length, clashes: clashes.length }
		});
		return { ok: true, seriesId, slots: made.length };
	});
}

const laterOf = (a: string, b: string) => (a > b ? a : b);
