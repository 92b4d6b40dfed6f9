import { requireViewer } from '$lib/server/guard';
import { movementCards } from '$lib/server/movements/queries';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	requireViewer(event, 'movements:write');
	return { movements: await movementCards() };
};
