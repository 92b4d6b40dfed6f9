import { parseTempo, repSeconds } from './tempo';

export const formats = [
	'straight',
	'superset',
	'rounds',
	'every-minute',
	'intervals',
	'timed-circuit',
	'as-many-rounds',
	'for-time',
	'free'
] as const;
export type Format = (typeof formats)[number];

/** What a prescription asks for, as far as its length goes. Seconds, metres, calories. */
export type Work = {
	sets?: number;
	reps?: number;
	/** The reps that the coach expects of a set to failure. */
	expectedReps?: number;
	seconds?: number;
	metres?: number;
	metresPerSecond?: number;
	calories?: number;
	caloriesPerMinute?: number;
	perSide?: boolean;
	tempo?: string;
	/** The movement's default where no tempo is given. */
	perRepS?: number;
	restS?: number;
};

/** A block, as far as its length goes. All times are whole seconds. */
export type TimedBlock = {
	format: Format;
	setUpS?: number;
	waves?: number;
	/** The whole block's length as the coach typed it, set-up and waves included. */
	typedS?: number;
	changeoverS?: number;
	rounds?: number;
	intervalS?: number;
	workS?: number;
	restS?: number;
	betweenS?: number;
	repeats?: number;
	capS?: number;
	prescriptions: readonly Work[];
};

export type Span = { startS: number; endS: number };
export type SessionLength = {
	/** When each block runs, in seconds from the class's start. */
	blocks: Span[];
	totalS: number;
	/** Class length less the total; negative when the session is too long. */
	slackS: number;
	/** "4 min over", or null when it fits. */
	said: string | null;
};

/** Changeover between the prescriptions of straight sets, in seconds (common practice, no source). */
const usualChangeoverS = 30;
/** An interval of every-minute work, in seconds. */
const usualIntervalS = 60;
/** A rep without a tempo whose movement gave no default, in seconds (common practice, no source). */
const usualRepS = 3;

/**
 * How long a session runs: its blocks one after another from the class's start. A figure that the
 * coach typed beats the estimate. What a block leaves out counts as once (sets, rounds, waves,
 * repeats) or as nothing (rest, set-up, cap), so that a half-written session still has a length.
 */
export function sessionLength(blocks: readonly TimedBlock[], classLengthS: number): SessionLength {
	const spans: Span[] = [];
	let totalS = 0;
	for (const block of blocks) {
		const startS = totalS;
		totalS += blockLength(block);
		spans.push({ startS, endS: totalS });
	}
	const slackS = classLengthS - totalS;
	return {
		blocks: spans,
		totalS,
		slackS,
		said: slackS < 0 ? `${minutesOver(slackS)} min over` : null
	};
}

/** Whole minutes, rounded up, by which a session with negative slack is too long; 0 when it fits. */
export const minutesOver = (slackS: number): number => (slackS < 0 ? Math.ceil(-slackS / 60) : 0);

/** Seconds from a block's start to its end. */
export function blockLength(block: TimedBlock): number {
	return block.typedS ?? (block.setUpS ?? 0) + (block.waves ?? 1) * oneWave(block);
}

function oneWave(block: TimedBlock): number {
	const { prescriptions, rounds = 1, restS = 0 } = block;
	switch (block.format) {
		case 'straight':
			return straightSets(prescriptions, block.changeoverS ?? usualChangeoverS);
		case 'superset':
		case 'rounds':
			return roundsOf(prescriptions, rounds);
		case 'every-minute':
			return rounds * (block.intervalS ?? usualIntervalS);
		case 'intervals':
			return apart(
				rounds,
				apart(prescriptions.length, block.workS ?? 0, restS),
				block.betweenS ?? restS
			);
		case 'timed-circuit':
		case 'as-many-rounds':
			return apart(block.repeats ?? 1, block.capS ?? 0, block.betweenS ?? 0);
		case 'for-time':
			return block.capS ?? 0;
		case 'free':
			return 0;
	}
}

function straightSets(prescriptions: readonly Work[], changeoverS: number): number {
	const lengths = prescriptions.map((p) => apart(p.sets ?? 1, workSeconds(p), p.restS ?? 0));
	return sum(lengths) + Math.max(0, lengths.length - 1) * changeoverS;
}

/** Only the very last rest goes; the rest after each other round is kept. */
function roundsOf(prescriptions: readonly Work[], rounds: number): number {
	const last = prescriptions.at(-1);
	if (!last || rounds < 1) return 0;
	return (
		rounds * sum(prescriptions.map((p) => workSeconds(p) + (p.restS ?? 0))) - (last.restS ?? 0)
	);
}

/** `times` spells of `each` seconds with `between` seconds between two of them. */
const apart = (times: number, each: number, between: number): number =>
	times < 1 ? 0 : times * each + (times - 1) * between;

/** Seconds of work in one set of a prescription, both sides included, rounded up. */
export function workSeconds(work: Work): number {
	return wholeSeconds(oneSide(work) * (work.perSide ? 2 : 1));
}

function oneSide(work: Work): number {
	if (work.seconds !== undefined) return work.seconds;
	if (work.metres !== undefined)
		return work.metresPerSecond ? work.metres / work.metresPerSecond : 0;
	if (work.calories !== undefined)
		return work.caloriesPerMinute ? (work.calories / work.caloriesPerMinute) * 60 : 0;
	return (work.reps ?? work.expectedReps ?? 0) * perRep(work);
}

function perRep(work: Work): number {
	const read = work.tempo ? parseTempo(work.tempo) : null;
	return read?.ok ? repSeconds(read.tempo) : (work.perRepS ?? usualRepS);
}

/** Rounds up, but not for the dust that binary fractions leave: 10 reps of 1.1 s are 11 s. */
const wholeSeconds = (seconds: number): number => Math.ceil(seconds - 1e-9);

const sum = (numbers: readonly number[]): number => numbers.reduce((a, b) => a + b, 0);
