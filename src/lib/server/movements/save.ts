import { and, eq, inArray, isNull, ne, sql } from 'drizzle-orm';
import { refuse, type Refused } from '$lib/domain/refusal';
import { audit } from '../audit/record';
import { write, type Tx } from '../db';
import { kitGroups, movements, patterns, variationNeeds, variations } from '../db/schema';
import type { Viewer } from '../guard';
import { touchLibrary } from '../kit/touch-library';

export type MovementInput = {
	name: string;
	pattern: (typeof patterns)[number];
	muscles: string[];
	perSide: boolean;
	secondsPerRep: number;
	cues: string;
	cautions: string;
	/** Hardest first. A rung with an id is one that there is; without, a new one. */
	ladder: {
		id: number | null;
		name: string;
		needs: { kitGroupId: number; quantity: number; peoplePerPiece: number }[];
	}[];
};

export type MovementRefusal = Refused<
	| 'not-found'
	| 'name-taken'
	| 'changed-meanwhile'
	| 'no-rung'
	| 'unknown-group'
	| 'sharing'
	| 'group-twice'
>;
type Actor = Pick<Viewer, 'personId'>;

/** Adds a movement with its ladder. */
export function addMovement(
	viewer: Actor,
	input: MovementInput,
	{ now }: { now: number }
): Promise<{ ok: true; id: number } | MovementRefusal> {
	return write(async (tx) => {
		const refused = await refusedMovement(tx, input, 0);
		if (refused) return refused;
		const { ladder, ...columns } = input;
		const { id } = await tx
			.insert(movements)
			.values({ ...columns, alwaysNeedsKit: needsKit(ladder), createdAt: now, updatedAt: now })
			.returning({ id: movements.id })
			.get();
		await saveLadder(tx, id, ladder, now);
		await touchLibrary(tx);
		const fact = { viewer, verb: 'movements.add', noun: 'movements', nounId: id, now };
		await audit(tx, { ...fact, detail: { name: input.name } });
		return { ok: true, id };
	});
}

/**
 * Saves a movement and its ladder. Rungs left out are archived, never deleted: sessions and
 * bookings that name them keep them. Refused when somebody saved since `basedOn`.
 */
export function saveMovement(
	viewer: Actor,
	id: number,
	input: MovementInput,
	{ basedOn, now }: { basedOn: number; now: number }
): Promise<{ ok: true; id: number } | MovementRefusal> {
	return write(async (tx) => {
		const row = await tx
			.select({ version: movements.version })
			.from(movements)
			.where(and(eq(movements.id, id), isNull(movements.archivedAt)))
			.get();
		if (!row) return refuse('not-found');
		if (row.version !== basedOn) return refuse('changed-meanwhile');
		const refused = await refusedMovement(tx, input, id);
		if (refused) return refused;
		const { ladder, ...columns } = input;
		await tx
			.update(movements)
			.set({
				...columns,
				alwaysNeedsKit: needsKit(ladder),
				version: sql`${movements.version} + 1`,
				updatedAt: now
			})
			.where(eq(movements.id, id));
		await saveLadder(tx, id, ladder, now);
		await touchLibrary(tx);
		const fact = { viewer, verb: 'movements.save', noun: 'movements', nounId: id, now };
		await audit(tx, { ...fact, detail: { name: input.name, rungs: ladder.length } });
		return { ok: true, id };
	});
}

export function archiveMovement(
	viewer: Actor,
	id: number,
	{ now }: { now: number }
): Promise<{ ok: true } | Refused<'not-found'>> {
	return write(async (tx) => {
		const gone = await tx
			.update(movements)
			.set({ archivedAt: now })
			.where(and(eq(movements.id, id), isNull(movements.archivedAt)))
			.returning({ id: movements.id });
		if (gone.length === 0) return refuse('not-found');
		await audit(tx, { viewer, verb: 'movements.archive', noun: 'movements', nounId: id, now });
		return { ok: true };
	});
}

const needsKit = (ladder: MovementInput['ladder']) => ladder.every(({ needs }) => needs.length > 0);

async function refusedMovement(
	tx: Tx,
	{ name, ladder }: MovementInput,
	own: number
): Promise<MovementRefusal | null> {
	if (ladder.length === 0) return refuse('no-rung');
	const same = await tx
		.select({ id: movements.id })
		.from(movements)
		.where(and(sql`lower(${movements.name}) = lower(${name})`, ne(movements.id, own)))
		.get();
	if (same) return refuse('name-taken', { name });
	const groups = await tx
		.select({ id: kitGroups.id, hasLoads: kitGroups.hasLoads })
		.from(kitGroups)
		.where(isNull(kitGroups.archivedAt));
	const byId = new Map(groups.map((group) => [group.id, group]));
	for (const { needs } of ladder) {
		if (new Set(needs.map((need) => need.kitGroupId)).size < needs.length)
			return refuse('group-twice');
		for (const { kitGroupId, quantity, peoplePerPiece } of needs) {
			const group = byId.get(kitGroupId);
			if (!group) return refuse('unknown-group');
			if (peoplePerPiece > 1 && (quantity > 1 || group.hasLoads)) return refuse('sharing');
		}
	}
	return null;
}

async function saveLadder(
	tx: Tx,
	movementId: number,
	ladder: MovementInput['ladder'],
	now: number
): Promise<void> {
	const there = await tx
		.select({ id: variations.id })
		.from(variations)
		.where(and(eq(variations.movementId, movementId), isNull(variations.archivedAt)));
	const known = new Set(there.map(({ id }) => id));
	const kept = new Set(ladder.flatMap(({ id }) => (id !== null && known.has(id) ? id : [])));
	const gone = [...known].filter((id) => !kept.has(id));
	if (gone.length > 0) {
		await tx.update(variations).set({ archivedAt: now }).where(inArray(variations.id, gone));
	}
	// Rungs are unique among those there are: move them out of the way before they take their places.
	if (kept.size > 0) {
		await tx
			.update(variations)
			.set({ rung: sql`${variations.rung} + 1000` })
			.where(inArray(variations.id, [...kept]));
	}
	for (const [rung, { id, name, needs }] of ladder.entries()) {
		const isKept = id !== null && kept.delete(id);
		if (isKept) await tx.update(variations).set({ name, rung }).where(eq(variations.id, id));
		const variationId = isKept
			? id
			: (
					await tx
						.insert(variations)
						.values({ movementId, name, rung })
						.returning({ id: variations.id })
						.get()
				).id;
		await tx.delete(variationNeeds).where(eq(variationNeeds.variationId, variationId));
		if (needs.length > 0) {
			await tx.insert(variationNeeds).values(needs.map((need) => ({ variationId, ...need })));
		}
	}
}
