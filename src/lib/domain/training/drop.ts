import type { DropRule } from './session';

/** A drop rule ready to be put in words: below so many reps, take the named variation or the next regression. */
export type DropSaid = {
	belowReps: number;
	/** The variation to drop to; null where the ladder ends. */
	toName: string | null;
	note: string | null;
};

/** `ladder` is the movement's, hardest first; "next regression" is one rung below the variation in hand. */
export function dropSaid(
	drop: DropRule,
	variationId: number,
	ladder: readonly { id: number; name: string }[]
): DropSaid {
	const at = ladder.findIndex((rung) => rung.id === variationId);
	const to =
		drop.to === 'next-regression'
			? at < 0
				? undefined
				: ladder[at + 1]
			: ladder.find((rung) => rung.id === drop.to);
	return { belowReps: drop.belowReps, toName: to?.name ?? null, note: drop.note || null };
}
