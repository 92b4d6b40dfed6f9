import { blockTitle } from '$lib/wording/blocks';
import type { SlotBlock } from './queries';

/** A block as a ribbon draws it; one without a title of its own has its kind's word. */
export type TitledBlock = Omit<SlotBlock, 'title'> & { title: string };

export const titledBlocks = (blocks: readonly SlotBlock[]): TitledBlock[] =>
	blocks.map((block) => ({ ...block, title: blockTitle(block) }));
