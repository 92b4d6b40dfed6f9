import { describe, expect, it } from 'vitest';
import { foldDay } from './fold';

const at = (clock: string) => {
	const [h, m] = clock.split(':').map(Number);
	return h! * 60 + m!;
};
const span = (from: string, to: string) => ({ fromMin: at(from), toMin: at(to) });

describe('the folded day', () => {
	const day = foldDay([
		span('06:30', '07:30'),
		span('09:30', '10:30'),
		span('17:30', '18:30'),
		span('18:40', '19:40'),
		span('07:00', '07:45')
	]);

	it('keeps the hours in which some class runs and folds the long pauses', () => {
		expect(day.stretches).toEqual([
			span('06:30', '07:45'),
			span('09:30', '10:30'),
			span('17:30', '19:45')
		]);
		expect(day.lengthMin).toBe(75 + 15 + 60 + 15 + 135);
		expect(day.gaps).toEqual([82.5, 157.5]);
	});

	it('draws every class at its own length', () => {
		expect(day.toGrid(at('06:30'))).toBe(0);
		expect(day.toGrid(at('09:30'))).toBe(90);
		expect(day.toGrid(at('18:40')) - day.toGrid(at('17:30'))).toBe(70);
	});

	it('says which minute of the day a line stands for, and none inside a fold', () => {
		for (const minute of [at('06:45'), at('09:30'), at('10:15'), at('19:00')]) {
			expect(day.toDay(day.toGrid(minute))).toBe(minute);
		}
		expect(day.toDay(80)).toBeNull();
	});

	it('leaves an hour of grid for a week without classes', () => {
		expect(foldDay([]).lengthMin).toBe(60);
		expect(foldDay([]).toDay(10)).toBeNull();
	});
});
