import type { Tx } from '..';
import { kitItems, kitSpells } from '../schema';
import { demoItems } from './kit-data';
import type { SeededLibrary } from './library';
import type { Records } from './records';
import type { Rooms } from './timetable';

const weekMs = 7 * 86_400_000;

/** What the gym owns. Returns the skipping ropes' row. */
export async function addItems(
	tx: Tx,
	{ groupIds }: SeededLibrary,
	roomIds: Rooms,
	createdAt: number
): Promise<number> {
	const rows = await tx
		.insert(kitItems)
		.values(
			demoItems.map(({ group, count, kg, room }) => ({
				kitGroupId: groupIds[group],
				count,
				loadKg: kg ?? null,
				roomId: room ? roomIds[room] : null,
				createdAt
			}))
		)
		.returning({ id: kitItems.id, group: kitItems.kitGroupId });
	return rows.find(({ group }) => group === groupIds.rope)!.id;
}

/** One of the pieces is out of service, from last week to next. */
export async function addSpell(
	tx: Tx,
	kitItemId: number,
	{ now, byId, records }: { now: number; byId: number; records: Records }
): Promise<void> {
	const fromAt = now - weekMs;
	const why = 'Handle split, new one ordered';
	const spell = { kitItemId, count: 1, fromAt, toAt: now + weekMs, why };
	await tx.insert(kitSpells).values({ ...spell, id: 1, createdAt: fromAt, createdById: byId });
	const fact = { verb: 'kit.out-of-service', noun: 'kit_spells', nounId: 1 };
	records.audit({ ...fact, at: fromAt, byId, detail: spell });
}
