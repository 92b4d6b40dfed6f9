import { and, eq, isNull } from 'drizzle-orm';
import { refuse, type Refused } from '$lib/domain/refusal';
import { audit } from '../audit/record';
import { write } from '../db';
import { passes } from '../db/schema';
import type { Viewer } from '../guard';

/** Ends a pass from now on; what it paid for stays paid. */
export function endPass(
	viewer: Pick<Viewer, 'personId'>,
	passId: number,
	{ why, now }: { why: string; now: number }
): Promise<{ ok: true } | Refused<'not-found'>> {
	return write(async (tx) => {
		const ended = await tx
			.update(passes)
			.set({ endedAt: now })
			.where(and(eq(passes.id, passId), isNull(passes.endedAt)))
			.returning({ id: passes.id });
		if (ended.length === 0) return refuse('not-found');
		const fact = { viewer, verb: 'passes.end', noun: 'passes', nounId: passId, now };
		await audit(tx, { ...fact, detail: { why } });
		return { ok: true };
	});
}
