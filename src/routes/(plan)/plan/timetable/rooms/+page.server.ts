import { editRoomForm, roomForm, whichRoomForm } from '$lib/forms/room';
import { requireViewer } from '$lib/server/guard';
import { planForm } from '$lib/server/plan-form';
import { addRoom } from '$lib/server/rooms/add';
import { archiveRoom, bringBackRoom } from '$lib/server/rooms/archive';
import { editRoom } from '$lib/server/rooms/edit';
import { listRooms } from '$lib/server/rooms/queries';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	requireViewer(event, 'schedule:write');
	return { rooms: await listRooms(event.locals.now) };
};

export const actions = {
	add: (event) => planForm(event, roomForm, (viewer, form) => addRoom(viewer, form, event.locals)),
	edit: (event) =>
		planForm(event, editRoomForm, (viewer, { roomId, ...draft }) =>
			editRoom(viewer, roomId, draft, event.locals)
		),
	archive: (event) =>
		planForm(event, whichRoomForm, (viewer, { roomId }) =>
			archiveRoom(viewer, roomId, event.locals)
		),
	bringBack: (event) =>
		planForm(event, whichRoomForm, (viewer, { roomId }) =>
			bringBackRoom(viewer, roomId, event.locals)
		)
} satisfies Actions;
