import { error } from '@sveltejs/kit';
import { env } from '$lib/server/env';
import type { PageServerLoad } from './$types';

/** Specimens of every part, for development and the demo. */
export const load: PageServerLoad = () => {
	if (env().mode === 'production') error(404);
	return {};
};
