import { db, type Queryable } from '../db';
import { affectedBy, type AffectedPerson } from './affected';
import { loadSlot } from './load';
import { slotById, type SlotRow } from './queries';
import { titledBlocks, type TitledBlock } from './titled-blocks';

/** A slot as staff change it. */
export type SlotPage = {
	row: Omit<SlotRow, 'session'>;
	session: { title: string; blocks: TitledBlock[] } | null;
	/** Who counts on it, in the order of booking. */
	people: Pick<AffectedPerson, 'bookingId' | 'name' | 'status'>[];
	/** What the form changes. */
	stand: {
		classTypeId: number;
		roomId: number;
		coachIds: number[];
		startsOn: string;
		startTime: string;
		lengthMin: number;
		setPlaces: number | null;
		sequence: number;
	};
	state: 'ahead' | 'ran' | 'called-off';
	isChangedByHand: boolean;
};

export async function slotPage(
	id: number,
	{ now }: { now: number },
	q: Queryable = db
): Promise<SlotPage | null> {
	const [row, slot, affected] = await Promise.all([
		slotById(id, { seesUnpublished: true }, q),
		loadSlot(id, q),
		affectedBy([{ slotId: id, becomes: { what: 'called-off' } }], q)
	]);
	if (!row || !slot) return null;
	return {
		row,
		session: row.session && {
			title: row.session.title,
			blocks: titledBlocks(row.session.blocks)
		},
		people: (affected[0]?.people ?? []).map(({ bookingId, name, status }) => ({
			bookingId,
			name,
			status
		})),
		stand: {
			classTypeId: slot.classTypeId,
			roomId: slot.roomId,
			coachIds: slot.coachIds,
			startsOn: slot.startsOn,
			startTime: slot.startTime,
			lengthMin: (slot.endsAt - slot.startsAt) / 60_000,
			setPlaces: slot.setPlaces,
			sequence: slot.sequence
		},
		state: slot.cancelledAt !== null ? 'called-off' : slot.startsAt <= now ? 'ran' : 'ahead',
		isChangedByHand: slot.changedAt !== null
	};
}
