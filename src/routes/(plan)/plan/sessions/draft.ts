import type { Block, Prescription, SessionContent } from '$lib/domain/training';
import type { Workshop } from '$lib/server/sessions/queries';

/** Ids that no block or prescription of the draft has yet. */
function freeId(taken: string[], letter: string): string {
	let number = taken.length + 1;
	while (taken.includes(`${letter}${number}`)) number += 1;
	return `${letter}${number}`;
}

const blockIds = (draft: SessionContent) => draft.blocks.map(({ id }) => id);
const prescriptionIds = (draft: SessionContent) =>
	draft.blocks.flatMap(({ prescriptions }) => prescriptions.map(({ id }) => id));

export const emptyDraft = (): SessionContent => ({ title: '', aim: '', blocks: [] });

/** A block as one begins it: its kind decides the format that is usual for it. */
export function newBlock(draft: SessionContent, kind: Block['kind']): Block {
	const common = {
		id: freeId(blockIds(draft), 'b'),
		kind,
		rotation: 'together' as const,
		waves: 1,
		setUpS: 0,
		prescriptions: []
	};
	switch (kind) {
		case 'warm-up':
		case 'cool-down':
			return { ...common, format: 'free', typedS: 480 };
		case 'circuit':
		case 'opener':
			return { ...common, format: 'intervals', rotation: 'split', rounds: 3, workS: 40, restS: 20 };
		case 'conditioning':
			return { ...common, format: 'every-minute', rounds: 10 };
		case 'finisher':
			return { ...common, format: 'as-many-rounds', capS: 300 };
		default:
			return { ...common, format: 'superset', rounds: 4 };
	}
}

export function newPrescription(
	draft: SessionContent,
	movement: Workshop['movements'][number]
): Prescription {
	return {
		id: freeId(prescriptionIds(draft), 'p'),
		movementId: movement.id,
		variationId: movement.ladder.find(({ archived }) => !archived)?.id ?? movement.ladder[0]!.id,
		sets: 3,
		reps: 8,
		restS: 60,
		perSide: movement.perSide,
		load: { kind: 'any' }
	};
}

/** A block once more, right below, with ids of its own. */
export function copyBlock(draft: SessionContent, at: number): Block {
	const block = structuredClone(draft.blocks[at]!);
	const taken = prescriptionIds(draft);
	block.id = freeId(blockIds(draft), 'b');
	for (const prescription of block.prescriptions) {
		prescription.id = freeId(taken, 'p');
		taken.push(prescription.id);
	}
	return block;
}

/** Moves an item one place; nothing where it is at the end already. */
export function moveIn<T>(items: T[], at: number, by: -1 | 1): void {
	const to = at + by;
	if (to < 0 || to >= items.length) return;
	[items[at], items[to]] = [items[to]!, items[at]!];
}

/** What is sent: fields that were emptied are left out, so that the rules see what was typed and no more. */
export function asSent(draft: SessionContent): SessionContent {
	return JSON.parse(
		JSON.stringify(draft, (_, value: unknown) =>
			value === null || value === '' || Number.isNaN(value) ? undefined : value
		)
	);
}
