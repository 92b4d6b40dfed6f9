import { localDateOf } from '$lib/domain/calendar';
import { write } from '..';
import { gyms, kitItems, kitSpells } from '../schema';
import { addBookings } from './bookings';
import { demoItems } from './kit-data';
import { addLibrary, type SeededLibrary } from './library';
import { addPeople } from './people';
import { randomFrom } from './random';
import { addClassTypes, addRooms, addSessions, addTimetable, zone } from './timetable';
import type { Tx } from '..';

export { addStarterLibrary } from './starter';

/**
 * Fills an empty database with Ropewalk Strength around `now` (epoch ms): the same gym for the
 * same day. Its accounts exist in such a database alone.
 */
export async function seedDemo({ now }: { now: number }): Promise<void> {
	const todayOn = localDateOf(now, zone);
	const random = randomFrom(Math.floor(Date.parse(todayOn) / 86_400_000));
	const { slots, members, deskId } = await write(async (tx) => {
		await tx.insert(gyms).values({
			id: 1,
			name: 'Ropewalk Strength',
			placeName: 'Galway',
			zone,
			currency: 'EUR',
			locale: 'en-IE',
			loadUnit: 'kg',
			weekStartsOn: 1,
			isDemo: true,
			createdAt: now
		});
		const roomIds = await addRooms(tx, now);
		const library = await addLibrary(tx, { now });
		await addItems(tx, library, roomIds, now);
		const { staffIds, members } = await addPeople(tx, { now, todayOn, random });
		const { programmeIds, revisionIds } = await addSessions(tx, library, staffIds.head!, now);
		const typeIds = await addClassTypes(tx, programmeIds, library.groupIds, now);
		const slots = await addTimetable(tx, typeIds, { staffIds, roomIds }, revisionIds, {
			now,
			todayOn
		});
		return { slots, members, deskId: staffIds.desk! };
	});
	await write((tx) => addBookings(tx, slots, members, { now, random, deskId }));
}

async function addItems(
	tx: Tx,
	{ groupIds }: SeededLibrary,
	roomIds: { floor: number; loft: number },
	now: number
): Promise<void> {
	const rows = await tx
		.insert(kitItems)
		.values(
			demoItems.map(({ group, count, kg, room }) => ({
				kitGroupId: groupIds[group],
				count,
				loadKg: kg ?? null,
				roomId: room ? roomIds[room] : null,
				createdAt: now
			}))
		)
		.returning({ id: kitItems.id, group: kitItems.kitGroupId });
	const ropes = rows.find(({ group }) => group === groupIds.rope)!;
	const week = 7 * 86_400_000;
	await tx.insert(kitSpells).values({
		kitItemId: ropes.id,
		count: 1,
		fromAt: now - week,
		toAt: now + week,
		why: 'Handle split, new one ordered',
		createdAt: now - week
	});
}
