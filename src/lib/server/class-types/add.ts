import type { Refused } from '$lib/domain/refusal';
import type { ClassTypeDraft } from '$lib/forms/class-type';
import { audit } from '../audit/record';
import { write } from '../db';
import { classTypes } from '../db/schema';
import type { Viewer } from '../guard';
import { readDraft } from './draft';

export async function addClassType(
	viewer: Viewer,
	draft: ClassTypeDraft,
	{ now }: { now: number }
): Promise<{ ok: true; classTypeId: number } | Refused> {
	return write(async (tx) => {
		const read = await readDraft(tx, draft, null);
		if (!read.ok) return read;
		const [made] = await tx
			.insert(classTypes)
			.values({ ...read.columns, createdAt: now })
			.returning({ id: classTypes.id });
		const classTypeId = made!.id;
		await audit(tx, {
			viewer,
			verb: 'class-types.add',
			noun: 'class_types',
			nounId: classTypeId,
			now,
			detail: read.columns
		});
		return { ok: true, classTypeId };
	});
}
