import { places, type Shortage } from '$lib/domain/kit';
import { refuse, type Refused } from '$lib/domain/refusal';
import type { Queryable } from '../db';
import { kitRegister } from '../kit/in-service';
import { library } from '../kit/library';
import { clustersOf, problemOf, type PlanSlot } from '../kit/plan';
import { planSlotsBetween } from './plan-slots';

/** How a slot is to stand or what is to be laid on it; what is left out stays. */
export type Revised = Partial<Omit<PlanSlot, 'id'>>;

export type ShortFor = { slotId: number; shortage: Shortage; item: string };

/**
 * The slots whose people would be served worse by the kit than they are now: no command adds a
 * claim that exceeds the kit in service, whoever asks. A shortage that is there already is not
 * theirs to answer for.
 */
export async function shortAfter(
	revised: ReadonlyMap<number, Revised>,
	spanning: { fromAt: number; toAt: number },
	q: Queryable
): Promise<ShortFor[]> {
	const { fromAt, toAt } = spanning;
	const [before, lib, register] = await Promise.all([
		planSlotsBetween(fromAt, toAt, q),
		library(q),
		kitRegister(fromAt, toAt, q)
	]);
	const after = before.map((slot) => ({ ...slot, ...revised.get(slot.id) }));
	const isAsked = ({ id, people }: PlanSlot) => revised.has(id) && people.length > 0;
	const servedBefore = new Map(
		served(before, isAsked).map(({ slotId, asWritten }) => [slotId, asWritten])
	);
	return served(after, isAsked).flatMap(({ slotId, asWritten, bottleneck }) =>
		bottleneck && asWritten < (servedBefore.get(slotId) ?? 0)
			? [{ slotId, shortage: bottleneck, item: lib.groups[bottleneck.group]?.plural ?? '' }]
			: []
	);

	function served(slots: PlanSlot[], asked: (slot: PlanSlot) => boolean) {
		return clustersOf(slots).flatMap((cluster) => {
			const ofCluster = cluster.filter(asked);
			if (ofCluster.length === 0) return [];
			const problem = problemOf(cluster, lib, register);
			return ofCluster.map(({ id, people }) => {
				const limits = { room: null, ratio: null, coaches: null, set: people.length };
				return { slotId: id, ...places(problem, { slotId: String(id), limits }) };
			});
		});
	}
}

/** The refusal of a command that would take kit from people who hold a place; null where none is taken. */
export async function refusedForKit(
	revised: ReadonlyMap<number, Revised>,
	spanning: { fromAt: number; toAt: number },
	q: Queryable
): Promise<Refused<'kit-short'> | null> {
	if (revised.size === 0) return null;
	const [first] = await shortAfter(revised, spanning, q);
	return first ? refuse('kit-short', { item: first.item, short: first.shortage.short }) : null;
}
