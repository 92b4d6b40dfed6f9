import { asc, desc, eq, isNull } from 'drizzle-orm';
import { db } from '../db';
import { kitGroups, kitItems, kitSpells, rooms } from '../db/schema';

export type SpellRow = {
	id: number;
	count: number;
	fromAt: number;
	toAt: number | null;
	why: string;
	state: 'coming' | 'running' | 'over';
};
export type ItemRow = {
	id: number;
	loadKg: number | null;
	count: number;
	inService: number;
	roomId: number | null;
	roomName: string | null;
	note: string | null;
	spells: SpellRow[];
};
export type GroupRow = {
	id: number;
	name: string;
	plural: string;
	hasLoads: boolean;
	count: number;
	inService: number;
	items: ItemRow[];
};

/** The register: every kind of kit with its pieces, and what is out of service. */
export async function kitGroupsWithItems({ now }: { now: number }): Promise<GroupRow[]> {
	const [groups, items, spells] = await Promise.all([
		db
			.select()
			.from(kitGroups)
			.where(isNull(kitGroups.archivedAt))
			.orderBy(asc(kitGroups.position)),
		db
			.select({
				id: kitItems.id,
				kitGroupId: kitItems.kitGroupId,
				loadKg: kitItems.loadKg,
				count: kitItems.count,
				roomId: kitItems.roomId,
				roomName: rooms.name,
				note: kitItems.note
			})
			.from(kitItems)
			.leftJoin(rooms, eq(rooms.id, kitItems.roomId))
			.where(isNull(kitItems.archivedAt))
			.orderBy(asc(kitItems.loadKg), asc(kitItems.id)),
		db.select().from(kitSpells).orderBy(desc(kitSpells.fromAt))
	]);
	return groups.map(({ id, name, plural, hasLoads }) => {
		const own = items
			.filter(({ kitGroupId }) => kitGroupId === id)
			.map(({ kitGroupId: _, ...item }) => withSpells(item, spells, now));
		const sum = (field: 'count' | 'inService') => own.reduce((n, item) => n + item[field], 0);
		return {
			id,
			name,
			plural,
			hasLoads,
			count: sum('count'),
			inService: sum('inService'),
			items: own
		};
	});
}

function withSpells(
	item: Omit<ItemRow, 'inService' | 'spells'>,
	spells: (typeof kitSpells.$inferSelect)[],
	now: number
): ItemRow {
	const own = spells
		.filter(({ kitItemId }) => kitItemId === item.id)
		.map(({ id, count, fromAt, toAt, why }): SpellRow => {
			const isOver = toAt !== null && toAt <= now;
			return {
				id,
				count,
				fromAt,
				toAt,
				why,
				state: isOver ? 'over' : fromAt > now ? 'coming' : 'running'
			};
		});
	const out = own.filter(({ state }) => state === 'running').reduce((n, { count }) => n + count, 0);
	return { ...item, inService: Math.max(0, item.count - out), spells: own.slice(0, 10) };
}
