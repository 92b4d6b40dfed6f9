import { myBookings } from '$lib/server/bookings/my-bookings';
import { requireViewer } from '$lib/server/guard';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const { personId } = requireViewer(event, 'bookings:write-own');
	const { now } = event.locals;
	return { ...(await myBookings(personId, { now })), now };
};
