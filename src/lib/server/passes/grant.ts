import { eq } from 'drizzle-orm';
import { refuse, type Refused } from '$lib/domain/refusal';
import { audit } from '../audit/record';
import { write } from '../db';
import { passes, people } from '../db/schema';
import type { Viewer } from '../guard';
import { grantCredits } from './credits';

export type PassInput = {
	personId: number;
	kind: 'membership' | 'pack';
	name: string;
	/** Classes a week; null is unlimited. Memberships only. */
	perWeek: number | null;
	/** Packs only. */
	credits: number | null;
	startsOn: string;
	endsOn: string | null;
	note: string | null;
};

/** Gives a person a membership or a pack of credits. */
export function grantPass(
	viewer: Pick<Viewer, 'personId'>,
	input: PassInput,
	{ now }: { now: number }
): Promise<
	{ ok: true; passId: number } | Refused<'not-found' | 'ends-before-start' | 'no-credits'>
> {
	return write(async (tx) => {
		const { kind, name, personId, startsOn, endsOn, note } = input;
		if (endsOn !== null && endsOn < startsOn) return refuse('ends-before-start');
		if (kind === 'pack' && !(input.credits !== null && input.credits >= 1))
			return refuse('no-credits');
		const person = await tx
			.select({ id: people.id })
			.from(people)
			.where(eq(people.id, personId))
			.get();
		if (!person) return refuse('not-found');
		const perWeek = kind === 'membership' ? input.perWeek : null;
		const byId = viewer.personId;
		const { id } = await tx
			.insert(passes)
			.values({
				personId,
				kind,
				name,
				perWeek,
				startsOn,
				endsOn,
				note,
				createdAt: now,
				createdById: byId
			})
			.returning({ id: passes.id })
			.get();
		if (kind === 'pack') await grantCredits(tx, id, input.credits!, { now, byId });
		const detail = { ...input };
		await audit(tx, { viewer, verb: 'passes.grant', noun: 'passes', nounId: id, now, detail });
		return { ok: true, passId: id };
	});
}
