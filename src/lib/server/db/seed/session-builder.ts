import {
	sessionPlan,
	type Block,
	type Prescription,
	type SessionContent
} from '$lib/domain/training';
import type { SeededLibrary } from './library';

/** A prescription before it has ids: its movement and, unless it is the hardest, its variation by name. */
export type Draft = {
	movement: string;
	variation?: string;
	kg?: [number, number];
	/** `to` is the next regression or a variation by name. */
	drop?: { belowReps: number; to: string; note?: string };
} & Partial<Omit<Prescription, 'id' | 'movementId' | 'variationId' | 'load' | 'drop'>>;

type BlockDraft = Omit<Partial<Block>, 'prescriptions' | 'id'> &
	Pick<Block, 'kind' | 'format'> & { prescriptions: Draft[] };

export type SessionDraft = {
	title: string;
	programme: 'Strength' | 'Engine' | 'Minimal kit';
	lengthMin: number;
	aim: string;
	blocks: BlockDraft[];
};

export const p = (movement: string, rest: Omit<Draft, 'movement'> = {}): Draft => ({
	movement,
	...rest
});

const split = { rotation: 'split' as const };

export const warmUp = (minutes: number, ...prescriptions: Draft[]): BlockDraft => ({
	kind: 'warm-up',
	format: 'free',
	typedS: minutes * 60,
	...split,
	prescriptions
});
/** Its length is what the session leaves, less two minutes of slack. */
export const coolDown = (...prescriptions: Draft[]): BlockDraft => ({
	kind: 'cool-down',
	format: 'free',
	prescriptions
});
export const straight = (
	kind: Block['kind'],
	title: string,
	...prescriptions: Draft[]
): BlockDraft => ({
	kind,
	title,
	format: 'straight',
	setUpS: 60,
	prescriptions
});
export const superset = (
	title: string,
	rounds: number,
	prescriptions: Draft[],
	more: Partial<BlockDraft> = {}
): BlockDraft => ({
	kind: 'strength',
	title,
	format: 'superset',
	rounds,
	setUpS: 90,
	prescriptions,
	...more
});
export const everyMinute = (
	kind: Block['kind'],
	title: string,
	minutes: number,
	prescriptions: Draft[],
	more: Partial<BlockDraft> = {}
): BlockDraft => ({
	kind,
	title,
	format: 'every-minute',
	rounds: minutes,
	setUpS: 60,
	prescriptions,
	...more
});
/** Stations taken in turn by groups that are spread over them. */
export const stations = (
	kind: Block['kind'],
	title: string,
	[rounds, workS, restS, betweenS]: [number, number, number, number],
	...prescriptions: Draft[]
): BlockDraft => ({
	kind,
	title,
	format: 'intervals',
	rounds,
	workS,
	restS,
	betweenS,
	setUpS: 60,
	...split,
	prescriptions
});
export const timed = (
	kind: Block['kind'],
	title: string,
	format: 'timed-circuit' | 'as-many-rounds' | 'for-time',
	minutes: number,
	prescriptions: Draft[],
	more: Partial<BlockDraft> = {}
): BlockDraft => ({ kind, title, format, capS: minutes * 60, setUpS: 30, prescriptions, ...more });

const secondsPerRep = ({ movements }: SeededLibrary) =>
	Object.fromEntries([...movements.values()].map((m) => [m.id, m.secondsPerRep]));

/** Gives a draft its ids and its cool-down what is left of the hour. */
export function build(draft: SessionDraft, library: SeededLibrary): SessionContent {
	let number = 0;
	const blocks: Block[] = draft.blocks.map((block, b) => ({
		rotation: 'together',
		waves: 1,
		setUpS: 0,
		...block,
		id: `b${b + 1}`,
		prescriptions: block.prescriptions.map((prescription) => {
			number += 1;
			const dosed = block.format === 'free' ? aMinuteOf(prescription) : prescription;
			return prescriptionOf(dosed, `p${number}`, library);
		})
	}));
	const last = blocks.at(-1)!;
	if (last.kind === 'cool-down' && last.typedS === undefined) {
		const before = { blocks: blocks.slice(0, -1) };
		const { totalS } = sessionPlan(before, draft.lengthMin * 60, secondsPerRep(library));
		const left = draft.lengthMin * 60 - totalS - 120;
		last.typedS = Math.min(600, Math.max(120, Math.floor(left / 60) * 60));
	}
	return { title: draft.title, aim: draft.aim, blocks };
}

/** Warming up and cooling down, a minute of each where nothing else is said. */
function aMinuteOf(draft: Draft): Draft {
	const isDosed = draft.reps ?? draft.seconds ?? draft.metres;
	return isDosed === undefined ? { ...draft, seconds: 60 } : draft;
}

function prescriptionOf(
	{ movement, variation, kg, drop, ...rest }: Draft,
	id: string,
	library: SeededLibrary
): Prescription {
	const known = library.movements.get(movement);
	if (!known) throw new Error(`no movement ${movement}`);
	const named = (name: string) => {
		const found = known.variations.get(name);
		if (found === undefined) throw new Error(`no variation ${name} of ${movement}`);
		return found;
	};
	const to = drop && (drop.to === 'next-regression' ? drop.to : named(drop.to));
	return {
		perSide: known.perSide,
		...rest,
		id,
		movementId: known.id,
		variationId: variation === undefined ? known.first : named(variation),
		...(drop && to !== undefined ? { drop: { ...drop, to } } : {}),
		load: kg ? { kind: 'kg', minKg: kg[0], maxKg: kg[1] } : { kind: 'any' }
	};
}
