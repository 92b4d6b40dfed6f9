import { instantOf } from '$lib/domain/calendar/zone';
import { refuse, type Refused } from '$lib/domain/refusal';
import type { SlotDraft } from '$lib/forms/slot';
import { audit } from '../audit/record';
import { isClosedOn } from '$lib/domain/calendar/closures';
import { closedDays } from '../closures/queries';
import { findClassType } from '../class-types/queries';
import { write, type Tx } from '../db';
import type { Viewer } from '../guard';
import { currentGym } from '../gym/queries';
import { findRoom } from '../rooms/queries';
import { missingFrom } from '../series/check';
import { affectedBy, type AffectedSlot, type Becomes } from './affected';
import { clashesOf } from './clashes';
import { refusedForKit } from './kit-check';
import { loadSlot, type SlotWithCoaches } from './load';
import { lookFirst, type Confirmed, type LookFirst } from './look';
import { moveSlots } from './move';
import { recordOverrides } from './overrides';
import { promoteWaiting } from './promote-waiting';
import { tellPeople } from './tell';

export type ChangeRefusal =
	| Refused<
			| 'not-found'
			| 'no-gym'
			| 'already-ran'
			| 'slot-cancelled'
			| 'changed-meanwhile'
			| 'starts-in-the-past'
			| 'closed-day'
			| 'unknown-class-type'
			| 'unknown-room'
			| 'unknown-coach'
			| 'kit-short'
	  >
	| LookFirst;

type Asked = Confirmed & { sequence: number; why: string; now: number };

/**
 * Changes one slot: its time, length, room, coaches, class type or places. It keeps its place in
 * its series and is left alone by later edits of it. Nobody is dropped, not even by fewer places:
 * who holds a place is shown first, and told where time, room or coach changes.
 */
export async function changeSlot(
	viewer: Viewer,
	slotId: number,
	draft: SlotDraft,
	{ sequence, why, now, ...confirmed }: Asked
): Promise<{ ok: true } | ChangeRefusal> {
	return write(async (tx) => {
		const [gym, slot] = [await currentGym(tx), await loadSlot(slotId, tx)];
		if (!gym) return refuse('no-gym');
		const closedToChange = refusedChange(slot, sequence, now);
		if (closedToChange) return closedToChange;
		const before = slot!;
		const startsAt = instantOf(draft.startsOn, draft.startTime, gym.zone);
		const after = { ...draft, startsAt, endsAt: startsAt + draft.lengthMin * 60_000 };
		if (startsAt <= now) return refuse('starts-in-the-past');
		const missing = await missingFrom(draft, tx);
		if (missing) return missing;
		if (isClosedOn(await closedDays(tx), draft.startsOn, draft.roomId)) return refuse('closed-day');

		const moved = isMoved(before, after);
		const clashes = moved ? await clashesOf([{ ...before, ...after, slotId }], tx) : [];
		const short = await shortOnceMoved(tx, before, after);
		if (short) return short;
		const becomes = await becomesOf(tx, before, after);
		const affected = becomes ? await affectedBy([{ slotId, becomes }], tx) : [];
		if (holdsStill(affected[0])) affected.length = 0;
		const look = lookFirst(affected, clashes, confirmed);
		if (look) return look;

		const overrideWhy = confirmed.overrideWhy ?? '';
		await recordOverrides(tx, clashes, { why: overrideWhy, byId: viewer.personId, now });
		const { classTypeId, roomId, startsOn, startTime, setPlaces } = draft;
		const columns = { classTypeId, roomId, startsOn, startTime, setPlaces: setPlaces ?? null };
		const times = { startsAt, endsAt: after.endsAt, changedAt: now };
		const coachIds = draft.coachIds;
		await moveSlots(tx, [{ slotId, columns: { ...columns, ...times }, coachIds }], now);
		await promoteWaiting(tx, [slotId], { viewer, now });
		const fact = `slot:${slotId}:changed:${sequence + 1}`;
		const told = await tellPeople(tx, affected, { gym, why: why || null, fact, now });
		await audit(tx, {
			viewer,
			verb: 'slots.change',
			noun: 'slots',
			nounId: slotId,
			now,
			detail: {
				before: pick(before),
				after: pick({ ...after, setPlaces: setPlaces ?? null }),
				told
			}
		});
		return { ok: true };
	});
}

function refusedChange(slot: SlotWithCoaches | null, sequence: number, now: number) {
	if (!slot) return refuse('not-found');
	if (slot.cancelledAt !== null) return refuse('slot-cancelled');
	if (slot.startsAt <= now) return refuse('already-ran');
	return slot.sequence === sequence ? null : refuse('changed-meanwhile');
}

type After = SlotDraft & { startsAt: number; endsAt: number };

const sameCoaches = (a: readonly number[], b: readonly number[]) =>
	a.length === b.length && a.every((id, i) => id === b[i]);

const isMoved = (before: SlotWithCoaches, after: After): boolean =>
	before.startsAt !== after.startsAt ||
	before.endsAt !== after.endsAt ||
	before.roomId !== after.roomId ||
	!sameCoaches(before.coachIds, after.coachIds);

async function shortOnceMoved(tx: Tx, before: SlotWithCoaches, after: After) {
	const type = await findClassType(after.classTypeId, tx);
	const { startsAt, endsAt, roomId } = after;
	const revised = { startsAt, endsAt, roomId, defaultClaims: type?.defaultClaims ?? [] };
	const spanning = {
		fromAt: Math.min(before.startsAt, startsAt),
		toAt: Math.max(before.endsAt, endsAt)
	};
	return refusedForKit(new Map([[before.id, revised]]), spanning, tx);
}

/** Fewer places concern nobody while those who are in have one each. */
function holdsStill(slot: AffectedSlot | undefined): boolean {
	if (slot?.becomes.what !== 'fewer-places') return false;
	const taken = slot.people.filter(({ status }) => status !== 'waitlisted').length;
	return taken <= slot.becomes.places;
}

/** What people on the slot would notice; null where nothing of it. */
async function becomesOf(tx: Tx, before: SlotWithCoaches, after: After): Promise<Becomes | null> {
	if (isMoved(before, after)) {
		const { startsAt, endsAt } = after;
		const room = before.roomId === after.roomId ? null : await findRoom(after.roomId, tx);
		const coaches = !sameCoaches(before.coachIds, after.coachIds);
		return { what: 'changed', startsAt, endsAt, room: room?.name ?? null, coaches };
	}
	const places = after.setPlaces;
	const fewer = places !== undefined && places < (before.setPlaces ?? Infinity);
	return fewer ? { what: 'fewer-places', places } : null;
}

const pick = (
	slot: Pick<
		SlotWithCoaches,
		'startsAt' | 'endsAt' | 'roomId' | 'classTypeId' | 'coachIds' | 'setPlaces'
	>
) => ({
	startsAt: slot.startsAt,
	endsAt: slot.endsAt,
	roomId: slot.roomId,
	classTypeId: slot.classTypeId,
	coachIds: slot.coachIds,
	setPlaces: slot.setPlaces
});
