import { z } from 'zod';
import { rowNumber } from './row-number';

export const roomForm = z.object({
	name: z.string().trim().min(1).max(60),
	/** The posted limit: everyone in the room, coaches too. */
	places: z.coerce.number().int().min(1).max(1000)
});
export type RoomDraft = z.infer<typeof roomForm>;

export const editRoomForm = roomForm.extend({ roomId: rowNumber });
export const whichRoomForm = z.object({ roomId: rowNumber });
