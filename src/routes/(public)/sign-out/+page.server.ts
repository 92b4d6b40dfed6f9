import { redirect } from '@sveltejs/kit';
import { leave } from '$lib/server/auth/leave';
import type { Actions } from './$types';

export const actions = {
	default: async (event) => {
		await leave(event);
		redirect(303, '/');
	}
} satisfies Actions;
