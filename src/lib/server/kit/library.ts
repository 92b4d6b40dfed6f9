import { asc } from 'drizzle-orm';
import type { MovementLibrary } from '$lib/domain/training';
import { db, type Queryable } from '../db';
import { gyms, kitGroups, movements, variationNeeds, variations } from '../db/schema';

export type LibraryMovement = {
	id: number;
	name: string;
	pattern: string;
	perSide: boolean;
	cues: string;
	cautions: string;
	secondsPerRep: number;
	ladder: {
		id: number;
		name: string;
		archived: boolean;
		needs: { group: string; quantity: number; peoplePerPiece: number }[];
	}[];
};

export type LibraryGroup = { id: number; name: string; plural: string; hasLoads: boolean };

/** Movements with their ladders and kit groups, as the rules take them. Groups are keyed by `String(id)`. */
export type Library = {
	version: number;
	movements: Record<number, LibraryMovement>;
	groups: Record<string, LibraryGroup>;
	loadedGroups: ReadonlySet<string>;
	rules: MovementLibrary;
};

/** By database, so that a test's file never answers for another's. */
const kept = new WeakMap<object, Library>();

/**
 * The library as it stands; read again only when `gyms.libraryVersion` has risen. What is read
 * inside a transaction is not kept: it may yet be undone.
 */
export async function library(q: Queryable = db): Promise<Library> {
	const [gym] = await q.select({ version: gyms.libraryVersion }).from(gyms).limit(1);
	return libraryAt(gym?.version ?? 0, q);
}

/** The library, for who has just read its version with something else. */
export async function libraryAt(version: number, q: Queryable = db): Promise<Library> {
	const known = kept.get(db);
	if (known?.version === version) return known;
	const read = await readLibrary(version, q);
	if (q === db) kept.set(db, read);
	return read;
}

async function readLibrary(version: number, q: Queryable): Promise<Library> {
	const [movementRows, rungs, needs, groupRows] = await Promise.all([
		q.select().from(movements),
		q.select().from(variations).orderBy(asc(variations.rung), asc(variations.id)),
		q.select().from(variationNeeds),
		q.select().from(kitGroups)
	]);
	const needsOf = groupBy(needs, (need) => need.variationId);
	const rungsOf = groupBy(rungs, (rung) => rung.movementId);
	const all: Record<number, LibraryMovement> = {};
	for (const row of movementRows) {
		all[row.id] = {
			...row,
			ladder: (rungsOf.get(row.id) ?? []).map((rung) => ({
				id: rung.id,
				name: rung.name,
				archived: rung.archivedAt !== null,
				needs: (needsOf.get(rung.id) ?? []).map((need) => ({
					group: String(need.kitGroupId),
					quantity: need.quantity,
					peoplePerPiece: need.peoplePerPiece
				}))
			}))
		};
	}
	const groups = Object.fromEntries(groupRows.map((group) => [String(group.id), group]));
	const loadedGroups = new Set(groupRows.filter((g) => g.hasLoads).map((g) => String(g.id)));
	return { version, movements: all, groups, loadedGroups, rules: all };
}

function groupBy<T>(rows: T[], key: (row: T) => number): Map<number, T[]> {
	const groups = new Map<number, T[]>();
	for (const row of rows) {
		const same = groups.get(key(row));
		if (same) same.push(row);
		else groups.set(key(row), [row]);
	}
	return groups;
}
