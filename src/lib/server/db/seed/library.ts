import type { Tx } from '..';
import { kitGroups, movements, variationNeeds, variations } from '../schema';
import { groups, type GroupKey } from './kit-data';
import { movementData, type SeedMovement } from './movement-data';

export type SeededLibrary = {
	groupIds: Record<GroupKey, number>;
	/** Movement name -> its id and its variations by name. */
	movements: Map<
		string,
		{
			id: number;
			perSide: boolean;
			secondsPerRep: number;
			variations: Map<string, number>;
			first: number;
		}
	>;
};

/** Writes kinds of kit and movements with their ladders. */
export async function addLibrary(
	tx: Tx,
	{ now }: { now: number },
	chosen: SeedMovement[] = movementData
): Promise<SeededLibrary> {
	const groupIds = {} as Record<GroupKey, number>;
	for (const [position, [key, group]] of Object.entries(groups).entries()) {
		const [row] = await tx
			.insert(kitGroups)
			.values({ ...group, position, createdAt: now })
			.returning({ id: kitGroups.id });
		groupIds[key as GroupKey] = row!.id;
	}
	const added: SeededLibrary['movements'] = new Map();
	for (const movement of chosen)
		added.set(movement.name, await addMovement(tx, movement, groupIds, now));
	return { groupIds, movements: added };
}

async function addMovement(
	tx: Tx,
	{ ladder, ...movement }: SeedMovement,
	groupIds: Record<GroupKey, number>,
	now: number
) {
	const alwaysNeedsKit = ladder.every(({ needs }) => needs.length > 0);
	const [row] = await tx
		.insert(movements)
		.values({ ...movement, alwaysNeedsKit, createdAt: now, updatedAt: now })
		.returning({ id: movements.id });
	const rows = await tx
		.insert(variations)
		.values(ladder.map(({ name }, rung) => ({ movementId: row!.id, name, rung })))
		.returning({ id: variations.id, name: variations.name, rung: variations.rung });
	const needs = rows.flatMap(({ id, rung }) =>
		ladder[rung]!.needs.map(({ group, ...need }) => ({
			variationId: id,
			kitGroupId: groupIds[group],
			...need
		}))
	);
	if (needs.length > 0) await tx.insert(variationNeeds).values(needs);
	const first = rows.find(({ rung }) => rung === 0)!.id;
	const { perSide, secondsPerRep } = movement;
	const byName = new Map(rows.map(({ name, id }) => [name, id]));
	return { id: row!.id, perSide, secondsPerRep, variations: byName, first };
}
