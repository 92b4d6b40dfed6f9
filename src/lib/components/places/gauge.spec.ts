import { render, screen } from '@testing-library/svelte';
import { describe, expect, it } from 'vitest';
import { gaugeMarks } from './gauge';
import PlacesGauge from './PlacesGauge.svelte';

const count = (marks: string[]) =>
	Object.fromEntries(
		[...new Set(marks)].map((mark) => [mark, marks.filter((x) => x === mark).length])
	);

describe('the places gauge', () => {
	it('has one mark a place, and hatches what the kit does not serve', () => {
		expect(count(gaugeMarks({ booked: 13, held: 1, limit: 16, roomFor: 18 }))).toEqual({
			booked: 13,
			held: 1,
			free: 2,
			beyond: 2
		});
	});

	it('ticks who came, among those booked', () => {
		expect(count(gaugeMarks({ attended: 9, booked: 14, limit: 16 }))).toEqual({
			in: 9,
			booked: 5,
			free: 2
		});
	});

	it('draws everyone who is in, even where places were lowered below them', () => {
		expect(count(gaugeMarks({ booked: 8, limit: 6, roomFor: 10 }))).toEqual({
			booked: 8,
			beyond: 2
		});
	});

	it('is never without a sentence', () => {
		render(PlacesGauge, { booked: 10, limit: 16, sentence: '6 places', mini: true });
		expect(screen.getByText('6 places')).toBeTruthy();
	});
});
