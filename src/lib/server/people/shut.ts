import { eq } from 'drizzle-orm';
import { refuse, type Refused } from '$lib/domain/refusal';
import { audit } from '../audit/record';
import { revokeSignInsOf } from '../auth/revoke';
import { write } from '../db';
import { people } from '../db/schema';
import type { Viewer } from '../guard';
import { isLastOwner } from './roles';

type Done = { ok: true };

/** Shuts an account: it cannot sign in, and whoever is signed in with it no longer is. */
export async function shutAccount(
	viewer: Viewer,
	personId: number,
	{ now }: { now: number }
): Promise<Done | Refused<'not-found' | 'yourself' | 'last-owner'>> {
	if (personId === viewer.personId) return refuse('yourself');
	return write(async (tx) => {
		if (await isLastOwner(tx, personId)) return refuse('last-owner');
		const [shut] = await tx
			.update(people)
			.set({ disabledAt: now })
			.where(eq(people.id, personId))
			.returning({ id: people.id });
		if (!shut) return refuse('not-found');
		await revokeSignInsOf(tx, personId, now);
		await audit(tx, { viewer, verb: 'people.shut', noun: 'people', nounId: personId, now });
		return { ok: true };
	});
}

export async function reopenAccount(
	viewer: Viewer,
	personId: number,
	{ now }: { now: number }
): Promise<Done | Refused<'not-found'>> {
	return write(async (tx) => {
		const [open] = await tx
			.update(people)
			.set({ disabledAt: null })
			.where(eq(people.id, personId))
			.returning({ id: people.id });
		if (!open) return refuse('not-found');
		await audit(tx, { viewer, verb: 'people.reopen', noun: 'people', nounId: personId, now });
		return { ok: true };
	});
}
