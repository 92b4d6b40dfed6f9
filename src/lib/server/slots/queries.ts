import { and, asc, eq, gt, gte, inArray, lt, type SQL } from 'drizzle-orm';
import type { LimitedBy } from '$lib/domain/kit';
import {
	sessionPlan,
	secondsPerRep,
	type BlockKind,
	type SessionContent
} from '$lib/domain/training';
import { db, type Queryable } from '../db';
import {
	classTypes,
	rooms,
	slotCoaches,
	slots,
	trainingSessions,
	sessionRevisions,
	type BookingStatus
} from '../db/schema';
import { library } from '../kit/library';
import { coachesBySlot, countsBySlot, mineBySlot } from './by-slot';
import { placesOf, type SlotLimits } from './places';
import { revisionContents } from './plan-slots';

export type PlaceCounts = {
	limit: number;
	limitedBy: LimitedBy;
	/** In, or come: held apart. */
	booked: number;
	held: number;
	waitlisted: number;
	free: number;
};

export type SlotBlock = {
	id: string;
	kind: BlockKind;
	title: string | null;
	startS: number;
	endS: number;
	effort: 1 | 2 | 3 | 4 | 5;
};

/** A slot as lists show it. Instants are epoch ms. `session` is there once published, or for staff. */
export type SlotRow = {
	id: number;
	uid: string;
	seriesId: number | null;
	kind: 'class' | 'private' | 'open-gym';
	startsOn: string;
	startsAt: number;
	endsAt: number;
	title: string;
	classType: { id: number; name: string; colour: string };
	room: { id: number; name: string; places: number };
	coaches: { id: number; name: string }[];
	cancelledAt: number | null;
	cancelReason: string | null;
	places: PlaceCounts;
	/** What the kit alone allows, as written and when later people go down a rung. */
	kitPlaces: { asWritten: number; withRegressions: number };
	revisionId: number | null;
	publishedAt: number | null;
	session: { id: number; title: string; blocks: SlotBlock[] } | null;
	sequence: number;
	modifiedAt: number;
	createdAt: number;
	mine: { id: number; status: BookingStatus; position: number | null } | null;
};

/** For whom a list is made: a member sees published sessions alone and their own bookings. */
export type SlotReader = { personId?: number; seesUnpublished?: boolean };

/** The slots that start from `fromAt` until just before `toAt`, in order of start. */
export function slotsBetween(
	fromAt: number,
	toAt: number,
	reader: SlotReader = {},
	q: Queryable = db
): Promise<SlotRow[]> {
	return slotRows(and(gte(slots.startsAt, fromAt), lt(slots.startsAt, toAt))!, reader, q);
}

export async function slotById(
	id: number,
	reader: SlotReader = {},
	q: Queryable = db
): Promise<SlotRow | null> {
	return (await slotRows(eq(slots.id, id), reader, q))[0] ?? null;
}

/** These slots, in order of start. */
export const slotsByIds = (
	ids: number[],
	reader: SlotReader = {},
	q: Queryable = db
): Promise<SlotRow[]> =>
	ids.length === 0 ? Promise.resolve([]) : slotRows(inArray(slots.id, ids), reader, q);

/** The slots of a coach from `fromAt` until just before `toAt`. */
export function slotsOfCoach(
	coachId: number,
	fromAt: number,
	toAt: number,
	reader: SlotReader = {},
	q: Queryable = db
): Promise<SlotRow[]> {
	const own = q
		.select({ id: slotCoaches.slotId })
		.from(slotCoaches)
		.where(eq(slotCoaches.personId, coachId));
	const during = and(gt(slots.endsAt, fromAt), lt(slots.startsAt, toAt), inArray(slots.id, own));
	return slotRows(during!, reader, q);
}

async function slotRows(where: SQL, reader: SlotReader, q: Queryable): Promise<SlotRow[]> {
	const rows = await q
		.select({
			slot: slots,
			classType: {
				id: classTypes.id,
				name: classTypes.name,
				colour: classTypes.colour,
				peoplePerCoach: classTypes.peoplePerCoach
			},
			room: { id: rooms.id, name: rooms.name, places: rooms.places },
			session: { id: trainingSessions.id, title: trainingSessions.title }
		})
		.from(slots)
		.innerJoin(classTypes, eq(classTypes.id, slots.classTypeId))
		.innerJoin(rooms, eq(rooms.id, slots.roomId))
		.leftJoin(sessionRevisions, eq(sessionRevisions.id, slots.sessionRevisionId))
		.leftJoin(trainingSessions, eq(trainingSessions.id, sessionRevisions.trainingSessionId))
		.where(where)
		.orderBy(asc(slots.startsAt), asc(slots.id));
	if (rows.length === 0) return [];

	const ids = rows.map(({ slot }) => slot.id);
	const [coachesOf, countsOf, mineOf] = await Promise.all([
		coachesBySlot(ids, q),
		countsBySlot(ids, q),
		reader.personId === undefined ? new Map() : mineBySlot(ids, reader.personId, q)
	]);
	const limits = new Map<number, SlotLimits>(
		rows
			.filter(({ slot }) => slot.cancelledAt === null)
			.map(({ slot, classType, room }) => [
				slot.id,
				{
					roomPlaces: room.places,
					coaches: coachesOf.get(slot.id)?.length ?? 0,
					peoplePerCoach: classType.peoplePerCoach,
					setPlaces: slot.setPlaces
				}
			])
	);
	const placed = await placesOf(
		limits,
		rows[0]!.slot.startsAt,
		Math.max(...rows.map(({ slot }) => slot.endsAt)),
		q
	);
	const shown = rows.filter(
		({ slot }) => slot.sessionPublishedAt !== null || reader.seesUnpublished
	);
	const contents = await revisionContents(
		shown.flatMap(({ slot }) => slot.sessionRevisionId ?? [])
	);
	const perRep = secondsPerRep((await library()).rules);

	return rows.map(({ slot, classType, room, session }) => {
		const isShown = slot.sessionPublishedAt !== null || reader.seesUnpublished === true;
		const content =
			slot.sessionRevisionId === null ? undefined : contents.get(slot.sessionRevisionId);
		const answer = placed.get(slot.id);
		const { booked = 0, held = 0, waitlisted = 0 } = countsOf.get(slot.id) ?? {};
		const limit = answer?.limit ?? 0;
		return {
			id: slot.id,
			uid: slot.uid,
			seriesId: slot.seriesId,
			kind: slot.kind,
			startsOn: slot.startsOn,
			startsAt: slot.startsAt,
			endsAt: slot.endsAt,
			title: isShown && session ? session.title : classType.name,
			classType: { id: classType.id, name: classType.name, colour: classType.colour },
			room,
			coaches: coachesOf.get(slot.id) ?? [],
			cancelledAt: slot.cancelledAt,
			cancelReason: slot.cancelReason,
			places: {
				limit,
				limitedBy: answer?.limitedBy ?? 'room',
				booked,
				held,
				waitlisted,
				free: Math.max(0, limit - booked - held)
			},
			kitPlaces: {
				asWritten: answer?.asWritten ?? 0,
				withRegressions: answer?.withRegressions ?? 0
			},
			revisionId: slot.sessionRevisionId,
			publishedAt: slot.sessionPublishedAt,
			session:
				isShown && session && content
					? { ...session, blocks: blocksOf(content, slot.endsAt - slot.startsAt, perRep) }
					: null,
			sequence: slot.sequence,
			modifiedAt: slot.modifiedAt,
			createdAt: slot.createdAt,
			mine: mineOf.get(slot.id) ?? null
		};
	});
}

/** The ribbon of a session in a class of so many milliseconds. */
export function blocksOf(
	content: SessionContent,
	lengthMs: number,
	perRep: ReturnType<typeof secondsPerRep>
): SlotBlock[] {
	return sessionPlan(content, lengthMs / 1000, perRep).blocks;
}
