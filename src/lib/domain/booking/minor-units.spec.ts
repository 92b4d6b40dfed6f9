import { describe, expect, it } from 'vitest';
import { fromMinorUnits, toMinorUnits } from './minor-units';

describe('amounts in minor units (ISO 4217, from memory)', () => {
	it('have as many decimals as the currency', () => {
		expect(toMinorUnits(14.5, 'EUR')).toBe(1450);
		expect(toMinorUnits(0.29, 'EUR')).toBe(29);
		expect(toMinorUnits(1200, 'JPY')).toBe(1200);
		expect(toMinorUnits(1.234, 'KWD')).toBe(1234);
	});

	it('come back as typed', () => {
		expect(fromMinorUnits(toMinorUnits(18.05, 'EUR'), 'EUR')).toBe(18.05);
	});
});
