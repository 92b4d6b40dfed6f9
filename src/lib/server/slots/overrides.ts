import { sql } from 'drizzle-orm';
import type { Tx } from '../db';
import { clashOverrides } from '../db/schema';
import type { Clash } from './clashes';

/** Records that somebody allowed these clashes, which lets the slot's own row pass the triggers. */
export async function recordOverrides(
	tx: Tx,
	clashes: readonly Pick<Clash, 'uid' | 'kind'>[],
	{ why, byId, now }: { why: string; byId: number; now: number }
): Promise<void> {
	const once = new Map(clashes.map(({ uid, kind }) => [`${kind} ${uid}`, { uid, kind }]));
	for (const { uid, kind } of once.values()) {
		await tx
			.insert(clashOverrides)
			.values({ slotUid: uid, kind, why, at: now, byId })
			.onConflictDoUpdate({
				target: [clashOverrides.slotUid, clashOverrides.kind],
				set: { why: sql`excluded.why`, at: now, byId }
			});
	}
}
