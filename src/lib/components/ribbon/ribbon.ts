/** A block as the ribbon draws it: whole seconds from the class's start, effort 1 (easy) to 5 (all out). */
export type RibbonBlock = {
	id?: string;
	title: string;
	startS: number;
	endS: number;
	effort: 1 | 2 | 3 | 4 | 5;
	note?: string;
};

/** A piece of the ribbon in percent of its width; `slack` is the empty rest of the hour. */
export type RibbonPiece =
	| { kind: 'block'; block: RibbonBlock; left: number; width: number }
	| { kind: 'slack'; left: number; width: number };

/** Blocks in order, then the slack, always last. A session that runs over is drawn to its own end. */
export function ribbonPieces(blocks: RibbonBlock[], lengthS: number): RibbonPiece[] {
	const endS = Math.max(0, ...blocks.map((block) => block.endS));
	const wholeS = Math.max(lengthS, endS, 1);
	const percent = (seconds: number) => (seconds / wholeS) * 100;
	const pieces: RibbonPiece[] = blocks
		.filter((block) => block.endS > block.startS)
		.map((block) => ({
			kind: 'block',
			block,
			left: percent(block.startS),
			width: percent(block.endS - block.startS)
		}));
	if (endS < wholeS)
		pieces.push({ kind: 'slack', left: percent(endS), width: percent(wholeS - endS) });
	return pieces;
}

/** A label shows only where it fits: characters x size x .53 + 12 pixels (DESIGN.md, Hour ribbon). */
export function labelFits(text: string, widthPx: number, sizePx: number): boolean {
	return widthPx > [...text].length * sizePx * 0.53 + 12;
}

export type Tick = { minute: number; height: 3.5 | 7 | 10 };

/** One a minute, taller at five, tallest and numbered at fifteen; phones drop the single minutes. */
export function ticks(lengthS: number, singles: boolean): Tick[] {
	const minutes = Math.floor(lengthS / 60);
	return Array.from({ length: minutes + 1 }, (_, minute) => ({
		minute,
		height: minute % 15 === 0 ? (10 as const) : minute % 5 === 0 ? (7 as const) : (3.5 as const)
	})).filter(({ height }) => singles || height > 3.5);
}

/** Outer corners by height: 3 up to 8 px, 6 up to 28, 10 above. */
export const outerRadius = (height: number): number => (height <= 8 ? 3 : height <= 28 ? 6 : 10);

const twoDigits = (n: number) => String(n).padStart(2, '0');

/** Clock text of a minute after the start, or the bare minute where no start is given. */
export function tickLabel(minute: number, startMin: number | undefined): string {
	if (startMin === undefined) return String(minute);
	const at = (startMin + minute) % 1440;
	return `${twoDigits(Math.floor(at / 60))}:${twoDigits(at % 60)}`;
}
