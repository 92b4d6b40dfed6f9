const liftX = 0.45;

/**
 * Points of a tempo as a line: down, flat, up, flat, in proportion of its four figures
 * (lowering, pause, lifting, pause; X counts .45 here, as it is the quickest lift).
 */
export function tempoPoints(tempo: string, width: number, height: number): [number, number][] {
	const figures = [...tempo].map((c) => (c === 'X' ? liftX : Number(c)));
	const whole = figures.reduce((sum, n) => sum + n, 0) || 1;
	const levels = [height, height, 0, 0];
	let x = 0;
	const points: [number, number][] = [[0, 0]];
	figures.forEach((figure, i) => {
		x += (figure / whole) * width;
		points.push([Math.round(x * 100) / 100, levels[i] ?? 0]);
	});
	return points;
}
