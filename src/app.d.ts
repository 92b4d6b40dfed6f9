import type { Viewer } from '$lib/server/guard';
import type { Gym } from '$lib/server/gym/queries';

declare global {
	namespace App {
		interface Locals {
			/** Who asks, loaded anew at each request; null when nobody is signed in. */
			viewer: Viewer | null;
			/** The instant of this request: everything in it happens at one time. */
			now: number;
			/** Null until the first run made one. */
			gym: Gym | null;
			requestId: string;
			theme: 'light' | 'dark' | null;
		}
		interface Error {
			message: string;
			/** The refusal or problem code, where there is one. */
			code?: string;
			/** Finds the fault in the log. */
			errorId?: string;
		}
		interface PageData {
			gym: Omit<Gym, 'isDemo'> | null;
			viewer: { name: string; personId: number; roles: string[]; capabilities: string[] } | null;
			theme: 'light' | 'dark' | null;
		}
	}
}

export {};
