import { eq } from 'drizzle-orm';
import { refuse, type Refused } from '$lib/domain/refusal';
import type { RoomDraft } from '$lib/forms/room';
import { audit } from '../audit/record';
import { write } from '../db';
import { rooms } from '../db/schema';
import type { Viewer } from '../guard';
import { promoteWaitingIn } from '../slots/promote-waiting';
import { findRoom, isRoomNameTaken } from './queries';

/**
 * Renames a room or changes its posted limit. A lower limit drops nobody: classes that hold
 * more people than it are listed until somebody decides.
 */
export async function editRoom(
	viewer: Viewer,
	roomId: number,
	draft: RoomDraft,
	{ now }: { now: number }
): Promise<{ ok: true } | Refused<'not-found' | 'name-taken'>> {
	return write(async (tx) => {
		const before = await findRoom(roomId, tx);
		if (!before) return refuse('not-found');
		if (await isRoomNameTaken(draft.name, roomId, tx)) return refuse('name-taken');
		await tx.update(rooms).set(draft).where(eq(rooms.id, roomId));
		if (draft.places > before.places) await promoteWaitingIn(tx, roomId, { viewer, now });
		await audit(tx, {
			viewer,
			verb: 'rooms.edit',
			noun: 'rooms',
			nounId: roomId,
			now,
			detail: { before: { name: before.name, places: before.places }, after: draft }
		});
		return { ok: true };
	});
}
