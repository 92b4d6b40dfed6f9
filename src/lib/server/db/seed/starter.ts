import type { Tx } from '..';
import { addLibrary } from './library';
import { movementData } from './movement-data';

/** One in two of the movements, in their order: each pattern is among them. */
const starters = movementData.filter((_, i) => i % 2 === 0);

/** Kinds of kit and movements with ladders for a new gym; it counts its own pieces. */
export async function addStarterLibrary(tx: Tx, { now }: { now: number }): Promise<void> {
	await addLibrary(tx, { now }, starters);
}
