import { eq } from 'drizzle-orm';
import { refuse, type Refused } from '$lib/domain/refusal';
import type { ClassTypeDraft } from '$lib/forms/class-type';
import { audit } from '../audit/record';
import { write } from '../db';
import { classTypes } from '../db/schema';
import type { Viewer } from '../guard';
import { readDraft } from './draft';
import { findClassType } from './queries';

/**
 * Changes what members see and the terms of booking. Slots keep their length; bookings keep
 * standing: a cut-off is read when somebody cancels.
 */
export async function editClassType(
	viewer: Viewer,
	classTypeId: number,
	draft: ClassTypeDraft,
	{ now }: { now: number }
): Promise<{ ok: true } | Refused> {
	return write(async (tx) => {
		const before = await findClassType(classTypeId, tx);
		if (!before) return refuse('not-found');
		const read = await readDraft(tx, draft, classTypeId);
		if (!read.ok) return read;
		await tx.update(classTypes).set(read.columns).where(eq(classTypes.id, classTypeId));
		await audit(tx, {
			viewer,
			verb: 'class-types.edit',
			noun: 'class_types',
			nounId: classTypeId,
			now,
			detail: { before, after: read.columns }
		});
		return { ok: true };
	});
}
