import { render, screen } from '@testing-library/svelte';
import { describe, expect, it } from 'vitest';
import HourRibbon from './HourRibbon.svelte';
import { labelFits, ribbonPieces, tickLabel, ticks, type RibbonBlock } from './ribbon';

const blocks: RibbonBlock[] = [
	{ title: 'Warm-up', startS: 0, endS: 480, effort: 1 },
	{ title: 'Strength', startS: 480, endS: 3000, effort: 4 }
];

describe('the hour ribbon', () => {
	it('is as wide as the class, with the slack last', () => {
		const pieces = ribbonPieces(blocks, 3600);
		expect(pieces.map(({ kind }) => kind)).toEqual(['block', 'block', 'slack']);
		expect(pieces.map(({ width }) => Math.round(width))).toEqual([13, 70, 17]);
	});

	it('has no slack when the session fills or overruns the class', () => {
		expect(ribbonPieces(blocks, 3000)).toHaveLength(2);
		expect(
			ribbonPieces(blocks, 2400)
				.map(({ width }) => width)
				.reduce((a, b) => a + b)
		).toBe(100);
	});

	it('shows a label only where it fits (DESIGN.md: characters x size x .53 + 12)', () => {
		expect(labelFits('Strength', 13 * 8 * 0.53 + 12, 13)).toBe(false);
		expect(labelFits('Strength', 13 * 8 * 0.53 + 12.1, 13)).toBe(true);
	});

	it('ticks each minute, taller at five, tallest at fifteen; phones drop the single ones', () => {
		expect(ticks(3600, true)).toHaveLength(61);
		expect(ticks(3600, false)).toHaveLength(13);
		expect(ticks(900, true).map(({ height }) => height)).toEqual([
			10, 3.5, 3.5, 3.5, 3.5, 7, 3.5, 3.5, 3.5, 3.5, 7, 3.5, 3.5, 3.5, 3.5, 10
		]);
		expect([tickLabel(15, undefined), tickLabel(15, 18 * 60 + 50)]).toEqual(['15', '19:05']);
	});

	it('says in words what it draws', () => {
		render(HourRibbon, { blocks, lengthS: 3600, size: 28 });
		expect(screen.getByRole('list')).toBeTruthy();
		expect(screen.getByText('Strength, minute 8 to 50')).toBeTruthy();
		expect(screen.getByText('Slack, minute 50 to 60')).toBeTruthy();
	});
});
