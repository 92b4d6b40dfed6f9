import { and, asc, eq, gt, isNull, lt, or } from 'drizzle-orm';
import type { KitItem } from '$lib/domain/kit';
import { db, type Queryable } from '../db';
import { prepared } from '../db/prepared';
import { kitItems, kitSpells } from '../db/schema';
import type { Library } from './library';

export type Spell = { kitItemId: number; count: number; fromAt: number; toAt: number | null };

/** What the gym owns and what is out of service at some time from `fromAt` to `toAt` (epoch ms). */
export type KitRegister = {
	items: {
		id: number;
		kitGroupId: number;
		loadKg: number | null;
		count: number;
		roomId: number | null;
	}[];
	spells: Spell[];
};

const itemsAndSpells = prepared<{ fromAt: number; toAt: number }>()((q, at) =>
	q
		.select({
			id: kitItems.id,
			kitGroupId: kitItems.kitGroupId,
			loadKg: kitItems.loadKg,
			count: kitItems.count,
			roomId: kitItems.roomId,
			out: kitSpells.count,
			outFromAt: kitSpells.fromAt,
			outToAt: kitSpells.toAt
		})
		.from(kitItems)
		.leftJoin(
			kitSpells,
			and(
				eq(kitSpells.kitItemId, kitItems.id),
				lt(kitSpells.fromAt, at('toAt')),
				or(isNull(kitSpells.toAt), gt(kitSpells.toAt, at('fromAt')))
			)
		)
		.where(isNull(kitItems.archivedAt))
		.orderBy(asc(kitItems.id), asc(kitSpells.id))
);

export async function kitRegister(
	fromAt: number,
	toAt: number,
	q: Queryable = db
): Promise<KitRegister> {
	const rows = await itemsAndSpells(q, { fromAt, toAt });
	const items = new Map<number, KitRegister['items'][number]>();
	const spells: Spell[] = [];
	for (const { out, outFromAt, outToAt, ...item } of rows) {
		items.set(item.id, item);
		if (out === null || outFromAt === null) continue;
		spells.push({ kitItemId: item.id, count: out, fromAt: outFromAt, toAt: outToAt });
	}
	return { items: [...items.values()], spells };
}

/**
 * The kit of the rules: pieces in service throughout `fromAt` to `toAt`. A piece that is out for
 * a part of that time is not promised for any of it. Groups of which the gym owns nothing are
 * there with none, so that a need of them is a shortage and not a fault.
 */
export function inServiceDuring(
	{ items, spells }: KitRegister,
	{ groups, loadedGroups }: Pick<Library, 'groups' | 'loadedGroups'>,
	fromAt: number,
	toAt: number
): KitItem[] {
	const kit: KitItem[] = items.map((item) => ({
		id: String(item.id),
		group: String(item.kitGroupId),
		inService: Math.max(0, item.count - mostOut(spells, item.id, fromAt, toAt)),
		...(item.loadKg === null ? {} : { loadKg: item.loadKg }),
		...(item.roomId === null ? {} : { room: String(item.roomId) })
	}));
	const owned = new Set(kit.map(({ group }) => group));
	for (const group of Object.keys(groups)) {
		if (owned.has(group)) continue;
		const load = loadedGroups.has(group) ? { loadKg: 0 } : {};
		kit.push({ id: `none-${group}`, group, inService: 0, ...load });
	}
	return kit;
}

/** The most pieces of an item that are out at one moment of the time. */
function mostOut(spells: Spell[], itemId: number, fromAt: number, toAt: number): number {
	const during = spells.filter(
		(s) => s.kitItemId === itemId && s.fromAt < toAt && (s.toAt === null || s.toAt > fromAt)
	);
	const starts = during.map((s) => Math.max(s.fromAt, fromAt));
	return Math.max(
		0,
		...starts.map((at) =>
			during
				.filter((s) => s.fromAt <= at && (s.toAt === null || s.toAt > at))
				.reduce((out, s) => out + s.count, 0)
		)
	);
}
