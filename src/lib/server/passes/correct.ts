import { eq } from 'drizzle-orm';
import { refuse, type Refused } from '$lib/domain/refusal';
import { audit } from '../audit/record';
import { write } from '../db';
import { passes } from '../db/schema';
import type { Viewer } from '../guard';
import { balanceOf } from './cover';
import { correctCredits } from './credits';

/** Adds credits to a pack or takes some out (below zero), with a reason; never below nothing. */
export function correctPack(
	viewer: Pick<Viewer, 'personId'>,
	passId: number,
	{ credits, why, now }: { credits: number; why: string; now: number }
): Promise<{ ok: true; balance: number } | Refused<'not-found' | 'pass-overdrawn' | 'no-credits'>> {
	return write(async (tx) => {
		if (!Number.isInteger(credits) || credits === 0) return refuse('no-credits');
		const pack = await tx
			.select({ kind: passes.kind, balance: balanceOf })
			.from(passes)
			.where(eq(passes.id, passId))
			.get();
		if (pack?.kind !== 'pack') return refuse('not-found');
		const balance = pack.balance + credits;
		if (balance < 0) return refuse('pass-overdrawn', { balance: pack.balance });
		await correctCredits(tx, passId, credits, { now, byId: viewer.personId, why });
		const fact = { viewer, verb: 'passes.correct', noun: 'passes', nounId: passId, now };
		await audit(tx, { ...fact, detail: { credits, why } });
		return { ok: true, balance };
	});
}
