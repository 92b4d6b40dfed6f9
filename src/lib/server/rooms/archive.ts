import { eq } from 'drizzle-orm';
import { refuse, type Refused } from '$lib/domain/refusal';
import { audit } from '../audit/record';
import { write } from '../db';
import { rooms } from '../db/schema';
import type { Viewer } from '../guard';
import { listRooms } from './queries';

/** Takes a room out of use. It keeps its past; a room with series or slots ahead stays. */
export async function archiveRoom(
	viewer: Viewer,
	roomId: number,
	{ now }: { now: number }
): Promise<{ ok: true } | Refused<'not-found' | 'room-in-use'>> {
	return write(async (tx) => {
		const room = (await listRooms(now, tx)).find(({ id }) => id === roomId);
		if (!room) return refuse('not-found');
		if (room.series + room.slotsAhead > 0) {
			return refuse('room-in-use', { series: room.series, slots: room.slotsAhead });
		}
		await tx.update(rooms).set({ archivedAt: now }).where(eq(rooms.id, roomId));
		await audit(tx, { viewer, verb: 'rooms.archive', noun: 'rooms', nounId: roomId, now });
		return { ok: true };
	});
}

/** Brings an archived room back. */
export async function bringBackRoom(
	viewer: Viewer,
	roomId: number,
	{ now }: { now: number }
): Promise<{ ok: true } | Refused<'not-found'>> {
	return write(async (tx) => {
		const [room] = await tx
			.update(rooms)
			.set({ archivedAt: null })
			.where(eq(rooms.id, roomId))
			.returning({ id: rooms.id });
		if (!room) return refuse('not-found');
		await audit(tx, { viewer, verb: 'rooms.bring-back', noun: 'rooms', nounId: roomId, now });
		return { ok: true };
	});
}
