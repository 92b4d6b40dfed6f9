import { and, count, eq, gte, inArray, isNotNull, isNull, lte } from 'drizzle-orm';
import { addDays } from '$lib/domain/calendar/civil-date';
import { refuse, type Refused } from '$lib/domain/refusal';
import { audit } from '../audit/record';
import { write } from '../db';
import { publications, slots } from '../db/schema';
import type { Viewer } from '../guard';

/**
 * Shows members the sessions laid in the week that starts on `weekOn`. Published again, it shows
 * what was laid since.
 */
export async function publishWeek(
	viewer: Viewer,
	weekOn: string,
	{ now }: { now: number }
): Promise<{ ok: true; slots: number } | Refused<'nothing-to-publish'>> {
	return write(async (tx) => {
		const laid = await tx
			.select({ id: slots.id })
			.from(slots)
			.where(
				and(
					gte(slots.startsOn, weekOn),
					lte(slots.startsOn, addDays(weekOn, 6)),
					isNull(slots.cancelledAt),
					isNotNull(slots.sessionRevisionId),
					isNull(slots.sessionPublishedAt)
				)
			);
		if (laid.length === 0) return refuse('nothing-to-publish');
		const ids = laid.map(({ id }) => id);
		const [before] = await tx
			.select({ n: count() })
			.from(publications)
			.where(eq(publications.weekOn, weekOn));
		await tx
			.update(slots)
			.set({ sessionPublishedAt: now, modifiedAt: now })
			.where(inArray(slots.id, ids));
		const [made] = await tx
			.insert(publications)
			.values({
				weekOn,
				at: now,
				byId: viewer.personId,
				slots: ids.length,
				isRepeat: (before?.n ?? 0) > 0
			})
			.returning({ id: publications.id });
		await audit(tx, {
			viewer,
			verb: 'weeks.publish',
			noun: 'publications',
			nounId: made!.id,
			now,
			detail: { weekOn, slots: ids.length }
		});
		return { ok: true, slots: ids.length };
	});
}
