/** Kinds of kit, by the key that the movements below name them with. */
export const groups = {
	bar: { name: 'pull-up bar place', plural: 'pull-up bar places', hasLoads: false },
	db: { name: 'dumbbell pair', plural: 'dumbbell pairs', hasLoads: true },
	kb: { name: 'kettlebell', plural: 'kettlebells', hasLoads: true },
	rower: { name: 'rower', plural: 'rowers', hasLoads: false },
	bike: { name: 'air bike', plural: 'air bikes', hasLoads: false },
	box: { name: 'box', plural: 'boxes', hasLoads: false },
	band: { name: 'long band', plural: 'long bands', hasLoads: false },
	rope: { name: 'skipping rope', plural: 'skipping ropes', hasLoads: false },
	bench: { name: 'bench', plural: 'benches', hasLoads: false },
	rings: { name: 'pair of rings', plural: 'pairs of rings', hasLoads: false },
	mat: { name: 'mat', plural: 'mats', hasLoads: false }
} as const;
export type GroupKey = keyof typeof groups;

/** What the demo gym owns: count, load in kg, home room. */
export const demoItems: { group: GroupKey; count: number; kg?: number; room?: 'floor' | 'loft' }[] =
	[
		{ group: 'bar', count: 8, room: 'floor' },
		{ group: 'db', kg: 5, count: 4 },
		{ group: 'db', kg: 7.5, count: 4 },
		{ group: 'db', kg: 10, count: 4 },
		{ group: 'db', kg: 12.5, count: 4 },
		{ group: 'db', kg: 15, count: 4 },
		{ group: 'db', kg: 17.5, count: 3 },
		{ group: 'db', kg: 20, count: 3 },
		{ group: 'db', kg: 22.5, count: 2 },
		{ group: 'db', kg: 25, count: 2 },
		{ group: 'db', kg: 27.5, count: 2 },
		{ group: 'db', kg: 30, count: 2 },
		{ group: 'kb', kg: 8, count: 2 },
		{ group: 'kb', kg: 12, count: 3 },
		{ group: 'kb', kg: 16, count: 3 },
		{ group: 'kb', kg: 20, count: 1 },
		{ group: 'kb', kg: 24, count: 1 },
		{ group: 'rower', count: 6 },
		{ group: 'bike', count: 4 },
		{ group: 'box', count: 10 },
		{ group: 'band', count: 12 },
		{ group: 'rope', count: 14 },
		{ group: 'bench', count: 6, room: 'floor' },
		{ group: 'bench', count: 2, room: 'loft' },
		{ group: 'rings', count: 6 },
		{ group: 'mat', count: 20 }
	];
