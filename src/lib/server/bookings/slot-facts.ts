import { eq, sql } from 'drizzle-orm';
import type { SessionContent } from '$lib/domain/training';
import type { Queryable } from '../db';
import { prepared } from '../db/prepared';
import { classTypes, gyms, rooms, slotCoaches, slots } from '../db/schema';
import { revisionContents } from '../slots/plan-slots';
import type { SlotLimits } from '../slots/places';

/** What a booking command must know of its slot, read in one go. */
export type SlotFacts = SlotLimits & {
	id: number;
	uid: string;
	startsAt: number;
	endsAt: number;
	startsOn: string;
	cancelledAt: number | null;
	content: SessionContent | null;
	className: string;
	about: string;
	whoMayBook: 'anyone' | 'pass-holders' | 'staff';
	opensDaysBefore: number;
	closesMinBefore: number;
	cutOffMin: number | null;
	cutOffClock: string | null;
	zone: string;
	weekStartsOn: number;
	/** For `libraryAt`. */
	libraryVersion: number;
};

const slotRow = prepared<{ slotId: number }>()((q, at) =>
	q
		.select({
			id: slots.id,
			uid: slots.uid,
			startsAt: slots.startsAt,
			endsAt: slots.endsAt,
			startsOn: slots.startsOn,
			cancelledAt: slots.cancelledAt,
			revisionId: slots.sessionRevisionId,
			setPlaces: slots.setPlaces,
			roomPlaces: rooms.places,
			coaches: sql<number>`(select count(*) from ${slotCoaches} where ${slotCoaches.slotId} = ${slots.id})`,
			peoplePerCoach: classTypes.peoplePerCoach,
			className: classTypes.name,
			about: classTypes.about,
			whoMayBook: classTypes.whoMayBook,
			opensDaysBefore: classTypes.opensDaysBefore,
			closesMinBefore: classTypes.closesMinBefore,
			cutOffMin: classTypes.cutOffMin,
			cutOffClock: classTypes.cutOffClock,
			zone: gyms.zone,
			weekStartsOn: gyms.weekStartsOn,
			libraryVersion: gyms.libraryVersion
		})
		.from(slots)
		.innerJoin(classTypes, eq(classTypes.id, slots.classTypeId))
		.innerJoin(rooms, eq(rooms.id, slots.roomId))
		.innerJoin(gyms, eq(gyms.id, 1))
		.where(eq(slots.id, at('slotId')))
);

export async function slotFacts(tx: Queryable, slotId: number): Promise<SlotFacts | null> {
	const [row] = await slotRow(tx, { slotId });
	if (!row) return null;
	const { revisionId, ...facts } = row;
	const content =
		revisionId === null ? null : ((await revisionContents([revisionId])).get(revisionId) ?? null);
	return { ...facts, content };
}
