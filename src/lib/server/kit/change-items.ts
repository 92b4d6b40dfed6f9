import { and, eq, isNull, ne, sql } from 'drizzle-orm';
import { refuse, type Refused } from '$lib/domain/refusal';
import { audit } from '../audit/record';
import { write, type Tx } from '../db';
import { kitGroups, kitItems, kitSpells } from '../db/schema';
import type { Viewer } from '../guard';

type Actor = Pick<Viewer, 'personId'>;
export type ItemInput = {
	kitGroupId: number;
	/** Null where the group's pieces do not differ by load. */
	loadKg: number | null;
	count: number;
	/** Null: the site shares them. */
	roomId: number | null;
	note: string | null;
};
type ItemRefusal = Refused<
	'not-found' | 'load-missing' | 'load-unwanted' | 'housing' | 'same-item' | 'fewer-than-out'
>;

/** Adds pieces of one load and home. Refused where the plan could not be counted then (planning.md, section 2). */
export function addItem(
	viewer: Actor,
	input: ItemInput,
	{ now }: { now: number }
): Promise<{ ok: true; id: number } | ItemRefusal> {
	return write(async (tx) => {
		const refused = await refusedItem(tx, input);
		if (refused) return refused;
		const { id } = await tx
			.insert(kitItems)
			.values({ ...input, createdAt: now })
			.returning({ id: kitItems.id })
			.get();
		const detail = { ...input };
		await audit(tx, { viewer, verb: 'kit.add-item', noun: 'kit_items', nounId: id, now, detail });
		return { ok: true, id };
	});
}

/** Changes the count, the home or the note of pieces; their load stays what it is. */
export function changeItem(
	viewer: Actor,
	id: number,
	input: Pick<ItemInput, 'count' | 'roomId' | 'note'>,
	{ now }: { now: number }
): Promise<{ ok: true } | ItemRefusal> {
	return write(async (tx) => {
		const item = await liveItem(tx, id);
		if (!item) return refuse('not-found');
		const { kitGroupId, loadKg } = item;
		const refused = await refusedItem(tx, { kitGroupId, loadKg, ...input }, id);
		if (refused) return refused;
		const out = await outNow(tx, id, now);
		if (input.count < out) return refuse('fewer-than-out', { out });
		await tx.update(kitItems).set(input).where(eq(kitItems.id, id));
		const detail = { from: { count: item.count, roomId: item.roomId }, to: input };
		await audit(tx, {
			viewer,
			verb: 'kit.change-item',
			noun: 'kit_items',
			nounId: id,
			now,
			detail
		});
		return { ok: true };
	});
}

export function archiveItem(
	viewer: Actor,
	id: number,
	{ now }: { now: number }
): Promise<{ ok: true } | Refused<'not-found'>> {
	return write(async (tx) => {
		if (!(await liveItem(tx, id))) return refuse('not-found');
		await tx.update(kitItems).set({ archivedAt: now }).where(eq(kitItems.id, id));
		await audit(tx, { viewer, verb: 'kit.archive-item', noun: 'kit_items', nounId: id, now });
		return { ok: true };
	});
}

/** Takes pieces out of service for a while; without an end until somebody says so. */
export function addSpell(
	viewer: Actor,
	input: { kitItemId: number; count: number; fromAt: number; toAt: number | null; why: string },
	{ now }: { now: number }
): Promise<
	{ ok: true; id: number } | Refused<'not-found' | 'ends-before-start' | 'more-than-owned'>
> {
	return write(async (tx) => {
		const item = await liveItem(tx, input.kitItemId);
		if (!item) return refuse('not-found');
		if (input.toAt !== null && input.toAt <= input.fromAt) return refuse('ends-before-start');
		if (input.count > item.count) return refuse('more-than-owned', { count: item.count });
		const { id } = await tx
			.insert(kitSpells)
			.values({ ...input, createdAt: now, createdById: viewer.personId })
			.returning({ id: kitSpells.id })
			.get();
		const detail = { ...input };
		await audit(tx, {
			viewer,
			verb: 'kit.out-of-service',
			noun: 'kit_spells',
			nounId: id,
			now,
			detail
		});
		return { ok: true, id };
	});
}

/** The pieces are back from now on. */
export function endSpell(
	viewer: Actor,
	id: number,
	{ now }: { now: number }
): Promise<{ ok: true } | Refused<'not-found'>> {
	return write(async (tx) => {
		const spell = await tx.select().from(kitSpells).where(eq(kitSpells.id, id)).get();
		if (!spell || (spell.toAt !== null && spell.toAt <= now)) return refuse('not-found');
		if (spell.fromAt >= now) await tx.delete(kitSpells).where(eq(kitSpells.id, id));
		else await tx.update(kitSpells).set({ toAt: now }).where(eq(kitSpells.id, id));
		await audit(tx, { viewer, verb: 'kit.back-in-service', noun: 'kit_spells', nounId: id, now });
		return { ok: true };
	});
}

async function refusedItem(tx: Tx, input: ItemInput, own = 0): Promise<ItemRefusal | null> {
	const group = await tx
		.select({ hasLoads: kitGroups.hasLoads })
		.from(kitGroups)
		.where(and(eq(kitGroups.id, input.kitGroupId), isNull(kitGroups.archivedAt)))
		.get();
	if (!group) return refuse('not-found');
	if (group.hasLoads && input.loadKg === null) return refuse('load-missing');
	if (!group.hasLoads && input.loadKg !== null) return refuse('load-unwanted');
	const others = await tx
		.select()
		.from(kitItems)
		.where(
			and(
				eq(kitItems.kitGroupId, input.kitGroupId),
				isNull(kitItems.archivedAt),
				ne(kitItems.id, own)
			)
		);
	if (others.some((o) => o.loadKg === input.loadKg && o.roomId === input.roomId)) {
		return refuse('same-item');
	}
	const mixed = others.some((o) => (o.roomId === null) !== (input.roomId === null));
	return group.hasLoads && mixed ? refuse('housing') : null;
}

const liveItem = (tx: Tx, id: number) =>
	tx
		.select()
		.from(kitItems)
		.where(and(eq(kitItems.id, id), isNull(kitItems.archivedAt)))
		.get();

async function outNow(tx: Tx, itemId: number, now: number): Promise<number> {
	const row = await tx
		.select({ n: sql<number>`coalesce(sum(${kitSpells.count}), 0)` })
		.from(kitSpells)
		.where(
			and(
				eq(kitSpells.kitItemId, itemId),
				sql`${kitSpells.fromAt} <= ${now} and (${kitSpells.toAt} is null or ${kitSpells.toAt} > ${now})`
			)
		)
		.get();
	return row?.n ?? 0;
}
