import { sessionLength, type SessionLength, type TimedBlock } from './length';
import type { Block, BlockKind, Prescription, SessionContent } from './session';

/** How hard a kind of block is, 1 to 5: the tone of its stretch of the ribbon (common practice, no source). */
export const effortOf: Record<BlockKind, 1 | 2 | 3 | 4 | 5> = {
	'warm-up': 1,
	'cool-down': 1,
	skill: 2,
	opener: 3,
	circuit: 3,
	conditioning: 3,
	strength: 4,
	finisher: 5
};

/** Seconds a rep takes where no tempo is given, by movement id. */
export type RepDefaults = Readonly<Record<number, number | undefined>>;

export type PlannedBlock = {
	id: string;
	kind: BlockKind;
	title: string | null;
	effort: 1 | 2 | 3 | 4 | 5;
	/** Seconds from the class's start. */
	startS: number;
	endS: number;
};
export type SessionPlan = Omit<SessionLength, 'blocks'> & { blocks: PlannedBlock[] };

/** A session's blocks on the clock of a class of `classLengthS` seconds, as the ribbon draws them. */
export function sessionPlan(
	content: Pick<SessionContent, 'blocks'>,
	classLengthS: number,
	secondsPerRep: RepDefaults
): SessionPlan {
	const timed = content.blocks.map((block) => withDefaults(block, secondsPerRep));
	const { blocks: spans, ...length } = sessionLength(timed, classLengthS);
	const blocks = content.blocks.map((block, b) => ({
		id: block.id,
		kind: block.kind,
		title: block.title || null,
		effort: effortOf[block.kind],
		startS: spans[b]!.startS,
		endS: spans[b]!.endS
	}));
	return { blocks, ...length };
}

/** The block with each prescription's seconds a rep: typed, else its movement's. */
function withDefaults(block: Block, secondsPerRep: RepDefaults): TimedBlock {
	const prescriptions = block.prescriptions.map((prescription: Prescription) => ({
		...prescription,
		perRepS: prescription.perRepS ?? secondsPerRep[prescription.movementId]
	}));
	return { ...block, prescriptions };
}
