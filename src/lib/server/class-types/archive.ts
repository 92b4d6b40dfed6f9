import { eq } from 'drizzle-orm';
import { refuse, type Refused } from '$lib/domain/refusal';
import { audit } from '../audit/record';
import { write } from '../db';
import { classTypes } from '../db/schema';
import type { Viewer } from '../guard';
import { findClassType, listClassTypes } from './queries';

/** Takes a class type off the forms. One with series or slots ahead stays. */
export async function archiveClassType(
	viewer: Viewer,
	classTypeId: number,
	{ now }: { now: number }
): Promise<{ ok: true } | Refused<'not-found' | 'class-type-in-use'>> {
	return write(async (tx) => {
		const type = (await listClassTypes(now, tx)).find(({ id }) => id === classTypeId);
		if (!type) return refuse('not-found');
		if (type.series + type.slotsAhead > 0) {
			return refuse('class-type-in-use', { series: type.series, slots: type.slotsAhead });
		}
		await tx.update(classTypes).set({ archivedAt: now }).where(eq(classTypes.id, classTypeId));
		await audit(tx, {
			viewer,
			verb: 'class-types.archive',
			noun: 'class_types',
			nounId: classTypeId,
			now
		});
		return { ok: true };
	});
}

/** Brings an archived class type back. */
export async function bringBackClassType(
	viewer: Viewer,
	classTypeId: number,
	{ now }: { now: number }
): Promise<{ ok: true } | Refused<'not-found'>> {
	return write(async (tx) => {
		if (!(await findClassType(classTypeId, tx))) return refuse('not-found');
		await tx.update(classTypes).set({ archivedAt: null }).where(eq(classTypes.id, classTypeId));
		await audit(tx, {
			viewer,
			verb: 'class-types.bring-back',
			noun: 'class_types',
			nounId: classTypeId,
			now
		});
		return { ok: true };
	});
}
