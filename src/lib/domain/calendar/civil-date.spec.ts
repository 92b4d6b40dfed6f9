import { describe, expect, it } from 'vitest';
import { addDays, daysFrom, isCivilDate, weekOf, weekday } from './civil-date';

describe('civil dates', () => {
	it('are read strictly: a day that does not exist is none', () => {
		expect(['2028-02-29', '2026-12-01'].every(isCivilDate)).toBe(true);
		expect(
			['2027-02-29', '2026-13-01', '2026-1-1', '', '2026-12-01T10:00', 'toString'].some(isCivilDate)
		).toBe(false);
	});

	it('count over months, years and leap days', () => {
		expect(addDays('2026-12-31', 1)).toBe('2027-01-01');
		expect(addDays('2028-02-28', 1)).toBe('2028-02-29');
		expect(addDays('2026-03-01', -1)).toBe('2026-02-28');
		expect(daysFrom('2026-11-30', 3)).toEqual(['2026-11-30', '2026-12-01', '2026-12-02']);
	});

	it('start their week on the day that the gym says (ISO 8601: 2026-12-01 is a Tuesday)', () => {
		expect(weekday('2026-12-01')).toBe(2);
		expect(weekday('2026-12-06')).toBe(7);
		expect(weekOf('2026-12-01')).toBe('2026-11-30');
		expect(weekOf('2026-12-06')).toBe('2026-11-30');
		expect(weekOf('2026-12-01', 7)).toBe('2026-11-29');
		expect(weekOf('2026-12-06', 7)).toBe('2026-12-06');
	});
});
