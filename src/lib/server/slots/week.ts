import { addDays, daysFrom } from '$lib/domain/calendar/civil-date';
import { isClosedOn } from '$lib/domain/calendar/closures';
import { instantOf } from '$lib/domain/calendar/zone';
import { listClosures } from '../closures/queries';
import { db, type Queryable } from '../db';
import { slotsBetween, type SlotRow } from './queries';
import { titledBlocks, type TitledBlock } from './titled-blocks';
import { shortagesAhead, type ShortageAhead } from './shortages';

/** A slot in the week's plan. */
export type WeekSlot = Pick<
	SlotRow,
	'id' | 'startsAt' | 'endsAt' | 'places' | 'cancelledAt' | 'publishedAt'
> & {
	session: { id: number; title: string; blocks: TitledBlock[] } | null;
	classType: string;
	room: string;
	coaches: string[];
	/** Kit that runs short in it, at planned places or for those who are in. */
	shortages: Pick<ShortageAhead, 'item' | 'short' | 'fromAt' | 'toAt' | 'isForBooked'>[];
	/** More people than it takes: somebody has to decide. */
	over: number;
};

export type WeekDay = { on: string; closed: string[]; slots: WeekSlot[] };

/** The week from its first day `weekOn`: each day's slots, called off ones too, and why a day is shut. */
export async function weekPlan(
	weekOn: string,
	zone: string,
	q: Queryable = db
): Promise<WeekDay[]> {
	const fromAt = instantOf(weekOn, '00:00', zone);
	const toAt = instantOf(addDays(weekOn, 7), '00:00', zone);
	const [rows, short, closures] = await Promise.all([
		slotsBetween(fromAt, toAt, { seesUnpublished: true }, q),
		shortagesAhead({ fromAt, toAt }, q),
		listClosures(weekOn, q)
	]);
	return daysFrom(weekOn, 7).map((on) => ({
		on,
		closed: closures
			.filter(({ fromOn, toOn }) => isClosedOn([{ fromOn, toOn }], on))
			.map(({ why, room }) => (room ? `${room}: ${why}` : why)),
		slots: rows.filter((row) => row.startsOn === on).map((row) => weekSlot(row, short))
	}));
}

function weekSlot(row: SlotRow, short: readonly ShortageAhead[]): WeekSlot {
	const { booked, held, limit } = row.places;
	return {
		id: row.id,
		startsAt: row.startsAt,
		endsAt: row.endsAt,
		places: row.places,
		session: row.session && { ...row.session, blocks: titledBlocks(row.session.blocks) },
		cancelledAt: row.cancelledAt,
		publishedAt: row.publishedAt,
		classType: row.classType.name,
		room: row.room.name,
		coaches: row.coaches.map(({ name }) => name),
		shortages: short
			.filter(({ blocks }) => blocks.some(({ slotId }) => slotId === row.id))
			.map(({ item, short: by, fromAt, toAt, isForBooked }) => ({
				item,
				short: by,
				fromAt,
				toAt,
				isForBooked
			})),
		over: row.cancelledAt === null ? Math.max(0, booked + held - limit) : 0
	};
}
