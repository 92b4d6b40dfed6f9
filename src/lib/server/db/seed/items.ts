import type { Tx } from '..';
import { kitItems, kitSpells } from '../schema';
import { demoItems } from './kit-data';
import type { SeededLibrary } from './library';
import type { Rooms } from './timetable';

const weekMs = 7 * 86_400_000;

/** What the gym owns, with one skipping rope out of service from last week to next. */
export async function addItems(
	tx: Tx,
	{ groupIds }: SeededLibrary,
	roomIds: Rooms,
	{ now, openedAt }: { now: number; openedAt: number }
): Promise<void> {
	const rows = await tx
		.insert(kitItems)
		.values(
			demoItems.map(({ group, count, kg, room }) => ({
				kitGroupId: groupIds[group],
				count,
				loadKg: kg ?? null,
				roomId: room ? roomIds[room] : null,
				createdAt: openedAt
			}))
		)
		.returning({ id: kitItems.id, group: kitItems.kitGroupId });
	const ropes = rows.find(({ group }) => group === groupIds.rope)!;
	await tx.insert(kitSpells).values({
		kitItemId: ropes.id,
		count: 1,
		fromAt: now - weekMs,
		toAt: now + weekMs,
		why: 'Handle split, new one ordered',
		createdAt: now - weekMs
	});
}
