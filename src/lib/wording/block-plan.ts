import type { Block } from '$lib/domain/training';
import * as m from './compiled/messages';

/** How a block is timed, as far as it is more than its prescriptions. */
export type BlockPlan = Pick<
	Block,
	| 'format'
	| 'rotation'
	| 'waves'
	| 'rounds'
	| 'intervalS'
	| 'workS'
	| 'restS'
	| 'betweenS'
	| 'repeats'
	| 'capS'
	| 'note'
>;

/** "3 rounds", "Every 60 s, 9 times", "As many rounds as you can in 8 min"; empty where there is nothing to say. */
export function blockPlan(block: BlockPlan): string {
	const waves = block.waves > 1 ? m.common_plan_waves({ waves: block.waves }) : '';
	const split = block.rotation === 'split' ? m.common_plan_split() : '';
	return [timing(block), split, waves, block.note ?? ''].filter(Boolean).join('. ');
}

function timing({ format, rounds = 1, workS, restS = 0, ...block }: BlockPlan): string {
	switch (format) {
		case 'superset':
		case 'rounds':
			return rounds > 1 ? m.common_plan_rounds({ rounds }) : '';
		case 'every-minute':
			return m.common_plan_every({ every: clock(block.intervalS ?? 60), rounds });
		case 'intervals': {
			if (workS === undefined) return '';
			const [work, rest] = [clock(workS), clock(restS)];
			const each =
				restS > 0 ? m.common_plan_work_rest({ work, rest }) : m.common_plan_work({ work });
			return rounds > 1 ? `${m.common_plan_rounds({ rounds })}, ${each}` : each;
		}
		case 'as-many-rounds':
			return block.capS === undefined ? '' : repeated(m.common_plan_as_many, block);
		case 'timed-circuit':
			return block.capS === undefined ? '' : repeated(m.common_plan_circuit, block);
		case 'for-time':
			return block.capS === undefined ? '' : m.common_plan_for_time({ time: clock(block.capS) });
		case 'straight':
		case 'free':
			return '';
	}
}

function repeated(
	say: (given: { time: string }) => string,
	{ capS = 0, repeats = 1, betweenS = 0 }: Pick<BlockPlan, 'capS' | 'repeats' | 'betweenS'>
): string {
	const once = say({ time: clock(capS) });
	if (repeats < 2) return once;
	const twice = m.common_plan_repeats({ once, repeats });
	return betweenS > 0 ? m.common_plan_between({ said: twice, between: clock(betweenS) }) : twice;
}

/** "40 s", "8 min", "1:30 min". */
function clock(seconds: number): string {
	if (seconds < 60) return m.common_seconds({ seconds });
	const [minutes, rest] = [Math.floor(seconds / 60), seconds % 60];
	return m.common_minutes({
		minutes: rest ? `${minutes}:${String(rest).padStart(2, '0')}` : minutes
	});
}
