/** The middle of `values`, the upper one of two. */
export function median(values: number[]): number {
	return [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)]!;
}
