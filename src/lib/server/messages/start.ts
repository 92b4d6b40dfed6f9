import type { Env } from '../env';

/** Starts what sends mail; returns what stops it. */
export async function startMail(_settings: Env): Promise<() => Promise<void>> {
	return async () => undefined;
}
