import { redirect } from '@sveltejs/kit';
import { requireViewer } from '$lib/server/guard';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = (event) => {
	requireViewer(event, 'schedule:write');
	redirect(303, '/plan/week');
};
