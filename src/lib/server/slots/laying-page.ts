import { inArray } from 'drizzle-orm';
import type { LimitedBy } from '$lib/domain/kit';
import { secondsPerRep } from '$lib/domain/training';
import type { LayDraft } from '$lib/forms/lay';
import { db, type Queryable } from '../db';
import { classTypes, rooms } from '../db/schema';
import { library } from '../kit/library';
import { lookAtLaying } from './lay';
import { limitsOfSlots } from './limits';
import { blocksOf } from './queries';
import { titledBlocks, type TitledBlock } from './titled-blocks';
import { plannedPlaces } from './shortages';
import type { LayingRefusal, LayingRow } from './plan-laying';

/** One slot on the page that asks before a session is laid. */
export type LayingSlot = {
	id: number;
	title: string;
	room: string;
	startsAt: number;
	endsAt: number;
	/** "4 min over"; null where it fits. */
	over: string | null;
	takes: number;
	/** What it would take without the kit's limit. */
	planned: number;
	limitedBy: LimitedBy;
	/** The kit that binds, and by how much at one person more. */
	bottleneck: { item: string; fromAt: number; toAt: number; short: number } | null;
	loses: string[];
	isShown: boolean;
};

export type LayingPage = {
	ok: true;
	session: { id: number; title: string; blocks: TitledBlock[]; lengthS: number } | null;
	slots: LayingSlot[];
	/** Kit that people who hold a place would lose: then it cannot be laid. */
	short: { item: string; short: number } | null;
	seen: string | null;
};

export async function layingPage(
	draft: LayDraft,
	{ now }: { now: number },
	q: Queryable = db
): Promise<LayingPage | LayingRefusal> {
	const looked = await lookAtLaying(draft, { now }, q);
	if (!looked.ok) return looked;
	const { laying, short, seen } = looked;
	const lib = await library(q);
	const ids = laying.rows.map(({ slot }) => slot.id);
	const [limits, types, halls] = await Promise.all([
		limitsOfSlots(ids, q),
		q
			.select()
			.from(classTypes)
			.where(
				inArray(
					classTypes.id,
					laying.rows.map(({ slot }) => slot.classTypeId)
				)
			),
		q
			.select()
			.from(rooms)
			.where(
				inArray(
					rooms.id,
					laying.rows.map(({ slot }) => slot.roomId)
				)
			)
	]);
	const lengthMs = Math.max(...laying.rows.map(({ slot }) => slot.endsAt - slot.startsAt));
	const row = ({ slot, over, places, clockAt, loses }: LayingRow): LayingSlot => ({
		id: slot.id,
		title: types.find(({ id }) => id === slot.classTypeId)?.name ?? '',
		room: halls.find(({ id }) => id === slot.roomId)?.name ?? '',
		startsAt: slot.startsAt,
		endsAt: slot.endsAt,
		over,
		takes: places.limit,
		planned: plannedPlaces(limits.get(slot.id)),
		limitedBy: places.limitedBy,
		bottleneck: places.bottleneck && {
			item: lib.groups[places.bottleneck.group]?.plural ?? '',
			short: places.bottleneck.short,
			fromAt: clockAt + places.bottleneck.from * 1000,
			toAt: clockAt + places.bottleneck.to * 1000
		},
		loses: loses.map(({ name }) => name),
		isShown: slot.sessionPublishedAt !== null
	});
	return {
		ok: true,
		session: laying.session && {
			id: laying.session.id,
			title: laying.session.title,
			blocks: titledBlocks(blocksOf(laying.content!, lengthMs, secondsPerRep(lib.rules))),
			lengthS: lengthMs / 1000
		},
		slots: laying.rows.map(row),
		short: short && { item: String(short.detail?.item), short: Number(short.detail?.short) },
		seen
	};
}
