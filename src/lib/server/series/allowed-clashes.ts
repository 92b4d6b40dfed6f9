import { eq, inArray, sql } from 'drizzle-orm';
import type { Tx } from '../db';
import { series, type AllowedClash } from '../db/schema';
import type { Clash } from '../slots/clashes';
import type { SeriesWithCoaches } from './queries';

/**
 * Which of a series' clashes somebody allowed before: said of either series about the other,
 * so that it does not matter whose dates are made first.
 */
export async function allowedBetween(
	tx: Tx,
	{ id, clashesAllowed }: Pick<SeriesWithCoaches, 'id' | 'clashesAllowed'>,
	clashes: readonly Clash[]
): Promise<Map<Clash, AllowedClash>> {
	const otherIds = [...new Set(clashes.flatMap(({ other }) => other.seriesId ?? []))];
	const others = await tx
		.select({ id: series.id, allowed: series.clashesAllowed })
		.from(series)
		.where(inArray(series.id, otherIds));
	const byOther = new Map(others.map((other) => [other.id, other.allowed]));
	const found = new Map<Clash, AllowedClash>();
	for (const clash of clashes) {
		const otherId = clash.other.seriesId;
		if (otherId === null) continue;
		const said =
			clashesAllowed.find((a) => a.kind === clash.kind && a.seriesId === otherId) ??
			byOther.get(otherId)?.find((a) => a.kind === clash.kind && a.seriesId === id);
		if (said) found.set(clash, said);
	}
	return found;
}

/** Adds what was just allowed to what a series was allowed before. */
export function withAllowed(
	before: readonly AllowedClash[],
	clashes: readonly Clash[],
	{ why, byId }: { why: string; byId: number }
): AllowedClash[] {
	const added = clashes.flatMap(({ kind, other }) =>
		other.seriesId === null ? [] : [{ kind, seriesId: other.seriesId, why, byId }]
	);
	const all = [...added, ...before];
	const keyOf = ({ kind, seriesId }: AllowedClash) => `${kind} ${seriesId}`;
	return [...new Map(all.reverse().map((a) => [keyOf(a), a])).values()];
}

/** A series that was split goes on being allowed what it was, by the series that named it too. */
export async function copyAllowed(tx: Tx, fromId: number, toId: number): Promise<void> {
	const naming = await tx
		.select({ id: series.id, allowed: series.clashesAllowed })
		.from(series)
		.where(sql`${series.clashesAllowed} <> '[]'`);
	for (const { id, allowed } of naming) {
		const copies = allowed
			.filter(({ seriesId }) => seriesId === fromId)
			.map((a) => ({ ...a, seriesId: toId }));
		if (copies.length === 0) continue;
		await tx
			.update(series)
			.set({ clashesAllowed: [...allowed, ...copies] })
			.where(eq(series.id, id));
	}
}
