import { eq } from 'drizzle-orm';
import { instantOf, localOf } from '$lib/domain/calendar/zone';
import { refuse, type Refused } from '$lib/domain/refusal';
import type { SeriesDraft } from '$lib/forms/series';
import { audit } from '../audit/record';
import { write, type Tx } from '../db';
import { series } from '../db/schema';
import type { Viewer } from '../guard';
import { currentGym } from '../gym/queries';
import { lookFirst, type Confirmed, type LookFirst } from '../slots/look';
import { recordOverrides } from '../slots/overrides';
import { copyAllowed, withAllowed } from './allowed-clashes';
import { applyReshape, planReshape } from './apply-reshape';
import { endRuleBefore } from '$lib/domain/calendar/write-rule';
import { findSeries, type SeriesWithCoaches } from './queries';
import { readSeriesDraft, type DraftRefusal, type SeriesColumns } from './read-draft';
import { insertSeries, setSeriesCoaches } from './rows';

export type EditSeriesRefusal =
	| DraftRefusal
	| LookFirst
	| Refused<
			| 'no-gym'
			| 'not-found'
			| 'changed-meanwhile'
			| 'series-ended'
			| 'starts-in-the-past'
			| 'no-dates'
			| 'kit-short'
	  >;

type Asked = Confirmed & {
	/** `following` splits the series at the draft's first day; `all` is every slot still ahead. */
	scope: 'following' | 'all';
	/** Slots changed by hand follow too. */
	includeChanged: boolean;
	/** The series' version as the form showed it. */
	version: number;
	now: number;
};

/**
 * Changes a recurring class from a day on, or wholly. Slots that ran stay as they ran. Who
 * counts on a slot that moves or falls out is shown first and told afterwards.
 */
export async function editSeries(
	viewer: Viewer,
	seriesId: number,
	draft: SeriesDraft,
	{ scope: asked, includeChanged, version, now, ...confirmed }: Asked
): Promise<{ ok: true; seriesId: number } | EditSeriesRefusal> {
	return write(async (tx) => {
		const [gym, before] = [await currentGym(tx), await findSeries(seriesId, tx)];
		if (!gym) return refuse('no-gym');
		if (!before) return refuse('not-found');
		if (before.endedAt !== null && before.endedAt <= now) return refuse('series-ended');
		if (before.version !== version) return refuse('changed-meanwhile');
		const todayOn = localOf(now, gym.zone).on;
		const isWhole = asked === 'all' || draft.startsOn <= before.startsOn;
		const scope = isWhole ? 'all' : 'following';
		if (scope === 'following' && draft.startsOn < todayOn) return refuse('starts-in-the-past');
		const startsOn = asked === 'all' ? before.startsOn : draft.startsOn;
		const read = await readSeriesDraft({ ...draft, startsOn }, gym, tx);
		if (!read.ok) return read;

		const { columns, coachIds } = read;
		const fromOn = scope === 'all' ? todayOn : draft.startsOn;
		const ask = { before, columns, coachIds, fromOn, todayOn, includeChanged, gym, now };
		const plan = await planReshape(tx, ask);
		if (plan.becomesEmpty) return refuse('no-dates');
		if (plan.short) return plan.short;
		const look = lookFirst(plan.affected, plan.clashes, confirmed, [scope, includeChanged]);
		if (look) return look;

		const by = { why: confirmed.overrideWhy ?? '', byId: viewer.personId };
		const clashesAllowed = withAllowed(before.clashesAllowed, plan.clashes, by);
		const after = { columns, coachIds, clashesAllowed };
		const afterId =
			scope === 'all'
				? await replace(tx, before, after)
				: await split(tx, before, after, { viewer, zone: gym.zone, now });
		await recordOverrides(tx, plan.clashes, { ...by, now });
		const done = await applyReshape(tx, viewer, plan, { seriesId: afterId, gym, now });
		await audit(tx, {
			viewer,
			verb: scope === 'all' ? 'series.edit' : 'series.split',
			noun: 'series',
			nounId: seriesId,
			now,
			detail: { fromOn, afterId, columns, coachIds, ...done }
		});
		return { ok: true, seriesId: afterId };
	});
}

type After = {
	columns: SeriesColumns;
	coachIds: number[];
	clashesAllowed: SeriesWithCoaches['clashesAllowed'];
};

async function replace(tx: Tx, before: SeriesWithCoaches, after: After): Promise<number> {
	const { columns, coachIds, clashesAllowed } = after;
	await tx
		.update(series)
		.set({ ...columns, clashesAllowed, version: before.version + 1 })
		.where(eq(series.id, before.id));
	await setSeriesCoaches(tx, before.id, coachIds);
	return before.id;
}

/** The old series keeps what ran and ends the day before; a new one goes on from there. */
async function split(
	tx: Tx,
	before: SeriesWithCoaches,
	{ columns, coachIds, clashesAllowed }: After,
	{ viewer, zone, now }: { viewer: Viewer; zone: string; now: number }
): Promise<number> {
	const endedAt = instantOf(columns.startsOn, '00:00', zone);
	const rule = endRuleBefore(before.rule, columns.startsOn);
	await tx
		.update(series)
		.set({ rule, version: before.version + 1, endedAt })
		.where(eq(series.id, before.id));
	const afterId = await insertSeries(tx, columns, coachIds, {
		clashesAllowed,
		splitFromId: before.id,
		createdAt: now,
		createdById: viewer.personId
	});
	await copyAllowed(tx, before.id, afterId);
	return afterId;
}
