import { eq } from 'drizzle-orm';
import { endRuleBefore } from '$lib/domain/calendar/write-rule';
import { addDays } from '$lib/domain/calendar/civil-date';
import { instantOf, localOf } from '$lib/domain/calendar/zone';
import { refuse, type Refused } from '$lib/domain/refusal';
import { audit } from '../audit/record';
import { write } from '../db';
import { series } from '../db/schema';
import type { Viewer } from '../guard';
import { currentGym } from '../gym/queries';
import { affectedBy } from '../slots/affected';
import { callOffSlots } from '../slots/call-off';
import { loadSlotsOfSeries } from '../slots/load';
import { lookFirst, type Confirmed, type LookFirst } from '../slots/look';
import { findSeries } from './queries';

/** Ends a recurring class after a day: its later slots are called off, people told. */
export async function endSeries(
	viewer: Viewer,
	seriesId: number,
	{ lastOn, why, now, ...confirmed }: Confirmed & { lastOn: string; why: string; now: number }
): Promise<
	| { ok: true; calledOff: number }
	| Refused<'no-gym' | 'not-found' | 'series-ended' | 'ends-before-start'>
	| LookFirst
> {
	return write(async (tx) => {
		const [gym, before] = [await currentGym(tx), await findSeries(seriesId, tx)];
		if (!gym) return refuse('no-gym');
		if (!before) return refuse('not-found');
		if (before.endedAt !== null && before.endedAt <= now) return refuse('series-ended');
		const yesterdayOn = addDays(localOf(now, gym.zone).on, -1);
		if (lastOn < before.startsOn && lastOn < yesterdayOn) return refuse('ends-before-start');

		const gone = (await loadSlotsOfSeries(seriesId, tx)).filter(
			(slot) =>
				slot.startsAt > now && slot.cancelledAt === null && keyDay(slot.recurrenceKey) > lastOn
		);
		const affected = await affectedBy(
			gone.map(({ id }) => ({ slotId: id, becomes: { what: 'called-off' } })),
			tx
		);
		const look = lookFirst(affected, [], confirmed, lastOn);
		if (look) return look;

		const endsOn = addDays(lastOn, 1);
		await tx
			.update(series)
			.set({
				rule: endRuleBefore(before.rule, endsOn),
				endedAt: Math.max(now, instantOf(endsOn, '00:00', gym.zone)),
				version: before.version + 1
			})
			.where(eq(series.id, seriesId));
		const fact = `series:${seriesId}:ended:${before.version}`;
		const released = await callOffSlots(tx, viewer, affected, { gym, why, fact, now });
		await audit(tx, {
			viewer,
			verb: 'series.end',
			noun: 'series',
			nounId: seriesId,
			now,
			detail: { lastOn, why, calledOff: gone.length, released }
		});
		return { ok: true, calledOff: gone.length };
	});
}

const keyDay = (key: string | null) => key?.slice(0, 10) ?? '';
