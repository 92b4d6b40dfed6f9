import { describe, expect, it } from 'vitest';
import { tempoPoints } from './tempo-trace';

describe('the tempo trace', () => {
	it('goes down, flat, up, flat, in proportion (DESIGN.md: X = .45)', () => {
		const points = tempoPoints('31X1', 545, 10);
		expect(points).toEqual([
			[0, 0],
			[300, 10],
			[400, 10],
			[445, 0],
			[545, 0]
		]);
	});

	it('leaves out what takes no time', () => {
		expect(tempoPoints('4010', 50, 10)).toEqual([
			[0, 0],
			[40, 10],
			[40, 10],
			[50, 0],
			[50, 0]
		]);
	});
});
