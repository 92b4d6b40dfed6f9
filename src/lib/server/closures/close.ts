import { and, eq, gte, lte } from 'drizzle-orm';
import { localOf } from '$lib/domain/calendar/zone';
import { refuse, type Refused } from '$lib/domain/refusal';
import type { ClosureDraft } from '$lib/forms/closure';
import { audit } from '../audit/record';
import { write, type Tx } from '../db';
import { closures, slots } from '../db/schema';
import type { Viewer } from '../guard';
import { currentGym } from '../gym/queries';
import { findRoom } from '../rooms/queries';
import { affectedBy } from '../slots/affected';
import { callOffSlots } from '../slots/call-off';
import { loadSlots } from '../slots/load';
import { lookFirst, type Confirmed, type LookFirst } from '../slots/look';

/** Shuts the gym or one room for whole days: slots of those days still ahead are called off. */
export async function close(
	viewer: Viewer,
	draft: ClosureDraft,
	{ now, ...confirmed }: Confirmed & { now: number }
): Promise<
	| { ok: true; closureId: number; calledOff: number }
	| Refused<'no-gym' | 'unknown-room' | 'starts-in-the-past'>
	| LookFirst
> {
	return write(async (tx) => {
		const gym = await currentGym(tx);
		if (!gym) return refuse('no-gym');
		const { roomId = null, fromOn, toOn, why } = draft;
		if (toOn < localOf(now, gym.zone).on) return refuse('starts-in-the-past');
		if (roomId !== null && !(await findRoom(roomId, tx))) return refuse('unknown-room');

		const gone = (await slotsOn(tx, { fromOn, toOn, roomId })).filter(
			(slot) => slot.startsAt > now && slot.cancelledAt === null
		);
		const affected = await affectedBy(
			gone.map(({ id }) => ({ slotId: id, becomes: { what: 'called-off' } })),
			tx
		);
		const look = lookFirst(affected, [], confirmed, { roomId, fromOn, toOn });
		if (look) return look;

		const [made] = await tx
			.insert(closures)
			.values({ roomId, fromOn, toOn, why, createdAt: now, createdById: viewer.personId })
			.returning({ id: closures.id });
		const closureId = made!.id;
		const fact = `closure:${closureId}`;
		const released = await callOffSlots(tx, viewer, affected, { gym, why, fact, now });
		await audit(tx, {
			viewer,
			verb: 'closures.close',
			noun: 'closures',
			nounId: closureId,
			now,
			detail: { roomId, fromOn, toOn, why, calledOff: gone.length, released }
		});
		return { ok: true, closureId, calledOff: gone.length };
	});
}

type Days = { fromOn: string; toOn: string; roomId: number | null };

/** Slots of these civil days in the room, or in all of them. */
export const slotsOn = (tx: Tx, { fromOn, toOn, roomId }: Days) =>
	loadSlots(
		and(
			gte(slots.startsOn, fromOn),
			lte(slots.startsOn, toOn),
			roomId === null ? undefined : eq(slots.roomId, roomId)
		),
		tx
	);
