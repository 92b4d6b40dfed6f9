import { and, gt, inArray, isNull, lt } from 'drizzle-orm';
import { db, type Queryable } from '../db';
import { classTypes, people, rooms, slots } from '../db/schema';
import { loadSlots, type SlotWithCoaches } from './load';

/** When and where a slot is to stand, and who coaches it. */
export type Stand = { startsAt: number; endsAt: number; roomId: number; coachIds: number[] };

/** `slotId` and `seriesId` are null for what is not there yet. */
export type Intended = Stand & { uid: string; slotId: number | null; seriesId: number | null };

/** A room or a coach asked for twice at once; `other` is the slot that is there already. */
export type Clash = {
	kind: 'room' | 'coach';
	uid: string;
	/** The room's name, or the coach's. */
	name: string;
	/** What was intended: its own start and end. */
	startsAt: number;
	endsAt: number;
	other: {
		slotId: number;
		seriesId: number | null;
		title: string;
		startsAt: number;
		endsAt: number;
	};
};

/** Slots last 12 h at most, as the schema holds. */
const longestMs = 43_200_000;

/** Where the intended slots overlap those that stand; the intended ones themselves do not count. */
export async function clashesOf(
	intended: readonly Intended[],
	q: Queryable = db
): Promise<Clash[]> {
	if (intended.length === 0) return [];
	const others = await standingAround(intended, q);
	const found = intended.flatMap((wanted) =>
		others.filter((other) => overlap(wanted, other)).flatMap((other) => between(wanted, other))
	);
	return found.length === 0 ? [] : named(found, q);
}

async function standingAround(intended: readonly Intended[], q: Queryable) {
	const from = Math.min(...intended.map(({ startsAt }) => startsAt)) - longestMs;
	const to = Math.max(...intended.map(({ endsAt }) => endsAt));
	const moved = new Set(intended.map(({ slotId }) => slotId));
	const standing = await loadSlots(
		and(gt(slots.startsAt, from), lt(slots.startsAt, to), isNull(slots.cancelledAt)),
		q
	);
	return standing.filter(({ id }) => !moved.has(id));
}

const overlap = (a: Stand, b: Stand) => a.startsAt < b.endsAt && a.endsAt > b.startsAt;

type Unnamed = { kind: 'room' | 'coach'; whoId: number; wanted: Intended; other: SlotWithCoaches };

function between(wanted: Intended, other: SlotWithCoaches): Unnamed[] {
	const both = wanted.coachIds.filter((id) => other.coachIds.includes(id));
	const ofCoaches = both.map((whoId) => ({ kind: 'coach' as const, whoId, wanted, other }));
	if (wanted.roomId !== other.roomId) return ofCoaches;
	return [{ kind: 'room', whoId: wanted.roomId, wanted, other }, ...ofCoaches];
}

async function named(found: Unnamed[], q: Queryable): Promise<Clash[]> {
	const typeIds = [...new Set(found.map(({ other }) => other.classTypeId))];
	const idsOf = (kind: 'room' | 'coach') => [
		...new Set(found.filter((clash) => clash.kind === kind).map(({ whoId }) => whoId))
	];
	const [titles, roomNames, coachNames] = await Promise.all([
		q.select().from(classTypes).where(inArray(classTypes.id, typeIds)),
		q
			.select()
			.from(rooms)
			.where(inArray(rooms.id, idsOf('room'))),
		q
			.select()
			.from(people)
			.where(inArray(people.id, idsOf('coach')))
	]);
	const nameIn = (rows: { id: number; name: string }[], id: number) =>
		rows.find((row) => row.id === id)?.name ?? '';
	return found.map(({ kind, whoId, wanted, other }) => ({
		kind,
		uid: wanted.uid,
		name: nameIn(kind === 'room' ? roomNames : coachNames, whoId),
		startsAt: wanted.startsAt,
		endsAt: wanted.endsAt,
		other: {
			slotId: other.id,
			seriesId: other.seriesId,
			title: nameIn(titles, other.classTypeId),
			startsAt: other.startsAt,
			endsAt: other.endsAt
		}
	}));
}
