/** A pass, as far as it can pay for a class on a day. Civil days are the gym's. */
export type HeldPass = {
	id: number;
	kind: 'membership' | 'pack';
	/** Classes a week; null is unlimited. Memberships only. */
	perWeek: number | null;
	startsOn: string;
	/** Last day it pays for, included; null while it goes on. */
	endsOn: string | null;
	/** When somebody ended it: it pays for nothing from then on. */
	endedAt: number | null;
	/** Credits left in a pack. */
	balance: number;
	/** Classes that this membership pays for already in the gym's week of the class. */
	usedThisWeek: number;
};

/** Whether a pass is in date on the class's civil day. */
export const isInDate = (
	{ startsOn, endsOn, endedAt }: Pick<HeldPass, 'startsOn' | 'endsOn' | 'endedAt'>,
	on: string
): boolean => endedAt === null && startsOn <= on && (endsOn === null || on <= endsOn);

/**
 * The pass that pays for a class on a civil day, by id; null where none does. Memberships go first,
 * the unlimited before those of so many a week, then packs: a credit is kept while something
 * else pays. Among equals the one that ends sooner, then the older.
 */
export function coveringPass(passes: readonly HeldPass[], on: string): number | null {
	const able = passes.filter((pass) => isInDate(pass, on) && hasRoom(pass));
	const [first] = able.sort(
		(a, b) => rank(a) - rank(b) || compare(a.endsOn, b.endsOn) || a.id - b.id
	);
	return first?.id ?? null;
}

const hasRoom = ({ kind, balance, perWeek, usedThisWeek }: HeldPass): boolean =>
	kind === 'pack' ? balance >= 1 : perWeek === null || usedThisWeek < perWeek;

const rank = ({ kind, perWeek }: HeldPass): number =>
	kind === 'pack' ? 2 : perWeek === null ? 0 : 1;

/** Sooner ends first; one that goes on comes last. */
function compare(a: string | null, b: string | null): number {
	if (a === b) return 0;
	if (a === null || b === null) return a === null ? 1 : -1;
	return a < b ? -1 : 1;
}
