import type { Tx } from '..';
import { addLibrary } from './library';
import { movementData } from './movement-data';

/** Half of the demo's movements: each pattern is among them, and most have a way without kit. */
export const starterNames: ReadonlySet<string> = new Set([
	'Goblet squat',
	'Box squat',
	'Squat jump',
	'Romanian deadlift',
	'Swing',
	'Hip thrust',
	'Press-up',
	'Floor press',
	'Bench press, dumbbells',
	'Shoulder press',
	'Half-kneeling press',
	'Bent-over row',
	'Ring row',
	'Band row',
	'Pull-up',
	'Hang',
	'Split squat',
	'Reverse lunge',
	'Step-up',
	'Farmer carry',
	'Suitcase carry',
	'Plank',
	'Side plank',
	'Dead bug',
	'Row, machine',
	'Air bike',
	'Skipping',
	'Burpee',
	'Band opener',
	'Hip opener'
]);

/** Kinds of kit and movements with ladders for a new gym; it counts its own pieces. */
export async function addStarterLibrary(tx: Tx, { now }: { now: number }): Promise<void> {
	const starters = movementData.filter(({ name }) => starterNames.has(name));
	await addLibrary(tx, { now }, starters);
}
