import type { BlockKind } from '$lib/domain/training';
import * as m from './compiled/messages';

const kinds: Record<BlockKind, () => string> = {
	'warm-up': m.common_block_warm_up,
	opener: m.common_block_opener,
	skill: m.common_block_skill,
	strength: m.common_block_strength,
	circuit: m.common_block_circuit,
	conditioning: m.common_block_conditioning,
	finisher: m.common_block_finisher,
	'cool-down': m.common_block_cool_down
};

export const blockKindWord = (kind: BlockKind): string => kinds[kind]();

/** A block's own title, else its kind in words. */
export const blockTitle = (block: { kind: BlockKind; title: string | null }): string =>
	block.title || blockKindWord(block.kind);
