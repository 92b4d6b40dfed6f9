import { and, eq, isNull, sql } from 'drizzle-orm';
import { refuse, type Refused } from '$lib/domain/refusal';
import { audit } from '../audit/record';
import { write } from '../db';
import { kitGroups, kitItems, variationNeeds, variations } from '../db/schema';
import type { Viewer } from '../guard';
import { touchLibrary } from './touch-library';

type Actor = Pick<Viewer, 'personId'>;

/** Adds a kind of kit. Whether its pieces differ by load is settled here, before it has pieces. */
export function addGroup(
	viewer: Actor,
	input: { name: string; plural: string; hasLoads: boolean },
	{ now }: { now: number }
): Promise<{ ok: true; id: number } | Refused<'name-taken'>> {
	return write(async (tx) => {
		const same = await tx
			.select({ id: kitGroups.id })
			.from(kitGroups)
			.where(sql`lower(${kitGroups.name}) = lower(${input.name})`)
			.get();
		if (same) return refuse('name-taken', { name: input.name });
		const { id } = await tx
			.insert(kitGroups)
			.values({
				...input,
				position: sql`(select coalesce(max(position), 0) + 1 from kit_groups)`,
				createdAt: now
			})
			.returning({ id: kitGroups.id })
			.get();
		await touchLibrary(tx);
		const detail = { ...input };
		await audit(tx, { viewer, verb: 'kit.add-group', noun: 'kit_groups', nounId: id, now, detail });
		return { ok: true, id };
	});
}

/** Takes a kind of kit off the register, once it has no pieces and no movement needs it. */
export function archiveGroup(
	viewer: Actor,
	id: number,
	{ now }: { now: number }
): Promise<{ ok: true } | Refused<'not-found' | 'group-in-use'>> {
	return write(async (tx) => {
		const pieces = await tx
			.select({ id: kitItems.id })
			.from(kitItems)
			.where(and(eq(kitItems.kitGroupId, id), isNull(kitItems.archivedAt)))
			.limit(1);
		const needs = await tx
			.select({ id: variations.id })
			.from(variationNeeds)
			.innerJoin(variations, eq(variations.id, variationNeeds.variationId))
			.where(and(eq(variationNeeds.kitGroupId, id), isNull(variations.archivedAt)))
			.limit(1);
		if (pieces.length > 0 || needs.length > 0) return refuse('group-in-use');
		const gone = await tx
			.update(kitGroups)
			.set({ archivedAt: now })
			.where(and(eq(kitGroups.id, id), isNull(kitGroups.archivedAt)))
			.returning({ id: kitGroups.id });
		if (gone.length === 0) return refuse('not-found');
		await touchLibrary(tx);
		await audit(tx, { viewer, verb: 'kit.archive-group', noun: 'kit_groups', nounId: id, now });
		return { ok: true };
	});
}
