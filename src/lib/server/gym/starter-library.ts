import type { Tx } from '../db';

type Starter = { addStarterLibrary: (tx: Tx, options: { now: number }) => Promise<void> };

/** Movements with their ladders, and kinds of kit, for a new gym to begin with. */
export async function addStarterLibrary(tx: Tx, options: { now: number }): Promise<void> {
	const [load] = Object.values(import.meta.glob<Starter>('../db/seed/starter.ts'));
	const starter = await load?.();
	await starter?.addStarterLibrary(tx, options);
}
