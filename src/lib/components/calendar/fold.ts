/** A stretch of the day in which some class runs on some day of the week. Minutes of the gym's day. */
export type OpenStretch = { fromMin: number; toMin: number };

/** The day with its closed hours taken out: what is left is drawn, each gap becomes one zigzag. */
export type FoldedDay = {
	stretches: OpenStretch[];
	/** Height left for a gap, in minutes of grid. */
	gapMin: number;
	lengthMin: number;
	/** Where a minute of the day is drawn, in minutes from the top. */
	toGrid(minute: number): number;
	/** The minute of the day drawn there, or null inside a gap. */
	toDay(gridMinute: number): number | null;
	/** Where the zigzags are, in minutes from the top. */
	gaps: number[];
};

const quarter = 15;

/**
 * Folds the closed hours of a week out of its day.
 * `spans` are the classes of the week in minutes of the day; pauses of `minPauseMin` or more fold.
 */
export function foldDay(spans: OpenStretch[], minPauseMin = 75, gapMin = 15): FoldedDay {
	const stretches = openStretches(spans, minPauseMin);
	const starts: number[] = [];
	let at = 0;
	for (const { fromMin, toMin } of stretches) {
		starts.push(at);
		at += toMin - fromMin + gapMin;
	}
	const lengthMin = Math.max(at - gapMin, 60);
	return {
		stretches,
		gapMin,
		lengthMin,
		gaps: starts.slice(1).map((start) => start - gapMin / 2),
		toGrid(minute) {
			const index = stretches.findIndex((s) => minute <= s.toMin);
			const stretch = stretches[index];
			if (!stretch) return lengthMin;
			return starts[index]! + Math.max(0, minute - stretch.fromMin);
		},
		toDay(gridMinute) {
			const index = starts.findLastIndex((start) => start <= gridMinute);
			const stretch = stretches[index];
			if (!stretch) return null;
			const minute = stretch.fromMin + gridMinute - starts[index]!;
			return minute <= stretch.toMin ? minute : null;
		}
	};
}

function openStretches(spans: OpenStretch[], minPauseMin: number): OpenStretch[] {
	const stretches: OpenStretch[] = [];
	for (const span of [...spans].sort((a, b) => a.fromMin - b.fromMin)) {
		const fromMin = Math.floor(span.fromMin / quarter) * quarter;
		const toMin = Math.ceil(span.toMin / quarter) * quarter;
		const last = stretches.at(-1);
		if (last && fromMin - last.toMin < minPauseMin) last.toMin = Math.max(last.toMin, toMin);
		else stretches.push({ fromMin, toMin });
	}
	return stretches;
}
