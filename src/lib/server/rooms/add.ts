import { count } from 'drizzle-orm';
import { refuse, type Refused } from '$lib/domain/refusal';
import type { RoomDraft } from '$lib/forms/room';
import { audit } from '../audit/record';
import { write } from '../db';
import { rooms } from '../db/schema';
import type { Viewer } from '../guard';
import { isRoomNameTaken } from './queries';

export async function addRoom(
	viewer: Viewer,
	draft: RoomDraft,
	{ now }: { now: number }
): Promise<{ ok: true; roomId: number } | Refused<'name-taken'>> {
	return write(async (tx) => {
		if (await isRoomNameTaken(draft.name, null, tx)) return refuse('name-taken');
		const [before] = await tx.select({ n: count() }).from(rooms);
		const [made] = await tx
			.insert(rooms)
			.values({ ...draft, position: before?.n ?? 0, createdAt: now })
			.returning({ id: rooms.id });
		const roomId = made!.id;
		await audit(tx, {
			viewer,
			verb: 'rooms.add',
			noun: 'rooms',
			nounId: roomId,
			now,
			detail: draft
		});
		return { ok: true, roomId };
	});
}
