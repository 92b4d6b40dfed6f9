import { localDateOf } from '$lib/domain/calendar';
import { addDays } from '$lib/domain/calendar/civil-date';
import { kitRegister } from '../../kit/in-service';
import { library } from '../../kit/library';
import { write, type Tx } from '..';
import { gyms } from '../schema';
import { addComing } from './coming';
import { Diary, inDayOrder } from './diary';
import { addItems, addSpell } from './items';
import { KitDesk } from './kit-desk';
import { addLibrary, type SeededLibrary } from './library';
import { addPast, type Plan } from './past';
import { addPeople } from './people';
import { addClassTypes, addRooms, addSessions } from './programme';
import { randomFrom } from './random';
import { Records } from './records';
import { limitsOfSeed, mostIn } from './seed-limits';
import { addTimetable, zone, type SeedSlot } from './timetable';
import { classTypeData } from './timetable-data';

const dayMs = 86_400_000;

/**
 * Fills an empty database with Ropewalk Strength around `now` (epoch ms): the same gym for the
 * same instant, all of it or nothing. Its accounts exist in such a database alone.
 */
export function seedDemo({ now }: { now: number }): Promise<void> {
	return write((tx) => seedIn(tx, now));
}

async function seedIn(tx: Tx, now: number): Promise<void> {
	const todayOn = localDateOf(now, zone);
	const random = randomFrom(Math.floor(Date.parse(todayOn) / dayMs));
	const records = new Records();
	const openedAt = Date.parse(addDays(todayOn, -730));
	await addGym(tx, openedAt);
	const roomIds = await addRooms(tx, openedAt);
	const seeded = await addLibrary(tx, { now: openedAt });
	const ropesId = await addItems(tx, seeded, roomIds, openedAt);
	const { staffIds, members } = await addPeople(tx, { now, todayOn, random, records });
	await addSpell(tx, ropesId, { now, byId: staffIds.coach, records });
	const programme = await addSessions(tx, seeded, staffIds.head, now - 60 * dayMs);
	const { contents, revisionIds } = programme;
	const typeIds = await addClassTypes(tx, programme.programmeIds, seeded.groupIds, openedAt);
	const given = { typeIds, revisionIds, staffIds, roomIds, records, now, todayOn };
	const slots = await addTimetable(tx, given);

	const most = (slot: SeedSlot) => mostIn(slot, roomIds);
	const plan: Plan = { now, random, staffIds, records, diary: new Diary(), most };
	const ran = slots.filter(({ endsAt }) => endsAt <= now);
	for (const slot of inDayOrder(ran, random)) {
		addPast(slot, members, plan);
		await new Promise(setImmediate);
	}
	const coming = slots.filter(({ endsAt, week }) => endsAt > now && week <= 4);
	const lib = await library(tx);
	const register = await kitRegister(now, now + 36 * dayMs, tx);
	const limits = new Map(coming.map((slot) => [slot.id, limitsOfSeed(slot, roomIds)]));
	const claims = (slot: SeedSlot) => defaultClaimsOf(slot, seeded);
	const desk = new KitDesk(coming, lib, register, limits, contents, claims);
	await addComing(coming, members, { ...plan, todayOn, desk, lib, groupIds: seeded.groupIds });
	await records.write(tx);
}

async function addGym(tx: Tx, createdAt: number): Promise<void> {
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
		createdAt
	});
}

const defaultClaimsOf = ({ type }: SeedSlot, { groupIds }: SeededLibrary) =>
	classTypeData
		.find(({ key }) => key === type)!
		.claims.map(({ group, quantity }) => ({
			kitGroupId: groupIds[group],
			quantity,
			peoplePerPiece: 1
		}));
