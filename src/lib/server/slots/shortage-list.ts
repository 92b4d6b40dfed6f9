import { inArray } from 'drizzle-orm';
import { blockTitle } from '$lib/wording/blocks';
import { db, type Queryable } from '../db';
import { rooms } from '../db/schema';
import { slotsBetween, type SlotRow } from './queries';
import { shortagesAhead, type ShortageAhead } from './shortages';

/** A shortage with the classes and blocks that make it, named. */
export type NamedShortage = Omit<ShortageAhead, 'blocks' | 'roomId'> & {
	room: string | null;
	startsOn: string;
	blocks: {
		slotId: number;
		title: string;
		/** Null where no session is laid: the class type's own claim. */
		block: string | null;
		startsAt: number;
		room: string;
		kitTakes: number;
		planned: number;
	}[];
};

/** A class with more people in it than it takes. */
export type Overfull = Pick<SlotRow, 'id' | 'title' | 'startsOn' | 'startsAt'> & {
	room: string;
	people: number;
	limit: number;
	limitedBy: SlotRow['places']['limitedBy'];
};

/** Everything ahead that wants a decision: kit that runs short, and classes that no longer hold. */
export async function shortageList(
	{ fromAt, toAt }: { fromAt: number; toAt: number },
	q: Queryable = db
): Promise<{ shortages: NamedShortage[]; overfull: Overfull[] }> {
	const [short, rows] = await Promise.all([
		shortagesAhead({ fromAt, toAt }, q),
		slotsBetween(fromAt, toAt, { seesUnpublished: true }, q)
	]);
	const roomIds = short.flatMap(({ roomId }) => roomId ?? []);
	const named = await q.select().from(rooms).where(inArray(rooms.id, roomIds));
	const byId = new Map(rows.map((row) => [row.id, row]));
	return {
		shortages: short.flatMap(({ blocks, roomId, ...rest }) => {
			const known = blocks.flatMap((block) => {
				const row = byId.get(block.slotId);
				return row ? [namedBlock(block, row)] : [];
			});
			const first = byId.get(known[0]?.slotId ?? 0);
			if (!first) return [];
			const room = named.find(({ id }) => id === roomId)?.name ?? null;
			return [{ ...rest, room, startsOn: first.startsOn, blocks: known }];
		}),
		overfull: rows.flatMap(overfull)
	};
}

function namedBlock(
	{ slotId, blockId, kitTakes, planned }: ShortageAhead['blocks'][number],
	row: SlotRow
): NamedShortage['blocks'][number] {
	const found = row.session?.blocks.find(({ id }) => id === blockId);
	const block = found ? blockTitle(found) : null;
	const { title, startsAt } = row;
	return { slotId, title, block, startsAt, room: row.room.name, kitTakes, planned };
}

function overfull(row: SlotRow): Overfull[] {
	const { booked, held, limit, limitedBy } = row.places;
	if (row.cancelledAt !== null || booked + held <= limit) return [];
	const { id, title, startsOn, startsAt } = row;
	const people = booked + held;
	return [{ id, title, startsOn, startsAt, room: row.room.name, people, limit, limitedBy }];
}
