import { createHash } from 'node:crypto';
import type { Refused } from '$lib/domain/refusal';
import type { AffectedSlot } from './affected';
import type { Clash } from './clashes';

/** What somebody must have seen before a change of theirs is made. */
export type Sight = {
	/** Slots with people on them, and what becomes of them. */
	affected: AffectedSlot[];
	/** Rooms and coaches asked for twice; they want a reason. */
	clashes: Clash[];
	/** Names exactly this sight; a change between looking and confirming makes another. */
	seen: string;
};

export type LookFirst = Refused<
	'look-first' | 'changed-meanwhile' | 'room-overlap' | 'coach-overlap'
> & { sight: Sight };

/** What the person who confirms sends back: the sight's name, and a reason where something clashes. */
export type Confirmed = { seen?: string; overrideWhy?: string };

/**
 * Asks to look before a change that people hold a place in, or that clashes. Null once exactly
 * this was seen and each clash has a reason: the change may be made.
 */
export function lookFirst(
	affected: AffectedSlot[],
	clashes: Clash[],
	{ seen, overrideWhy }: Confirmed,
	alsoNamed: unknown = null
): LookFirst | null {
	const held = affected.filter(({ people }) => people.length > 0);
	if (held.length === 0 && clashes.length === 0) return null;
	const sight: Sight = { affected: held, clashes, seen: nameOf([held, clashes, alsoNamed]) };
	if (seen === undefined) {
		const [clash] = clashes;
		const refused = clash ? (`${clash.kind}-overlap` as const) : 'look-first';
		return { ok: false, refused, detail: detailOf(clash), sight };
	}
	if (seen !== sight.seen) return { ok: false, refused: 'changed-meanwhile', sight };
	if (clashes.length > 0 && !overrideWhy) {
		const [clash] = clashes;
		return { ok: false, refused: `${clash!.kind}-overlap`, detail: detailOf(clash), sight };
	}
	return null;
}

const detailOf = (clash: Clash | undefined): Record<string, string> | undefined =>
	clash && { name: clash.name, title: clash.other.title };

/** Left out: addresses, and uids, which are new each time for slots that are not there yet. */
const nameOf = (sight: unknown): string =>
	createHash('sha256')
		.update(JSON.stringify(sight, (key, value) => (/^(email|uid)$/.test(key) ? undefined : value)))
		.digest('base64url')
		.slice(0, 22);
