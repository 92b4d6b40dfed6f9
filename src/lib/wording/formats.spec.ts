import { describe, expect, it } from 'vitest';
import { createFormats } from './formats';

const galway = createFormats({
	locale: 'en-IE',
	zone: 'Europe/Dublin',
	currency: 'EUR',
	loadUnit: 'kg',
	weekStartsOn: 1
});
const at = (iso: string) => Date.parse(iso);

describe('words for dates, money and loads', () => {
	it('show the gym’s clock in 24 hours, summer and winter', () => {
		expect(galway.time(at('2027-02-16T18:40:00Z'))).toBe('18:40');
		expect(galway.time(at('2027-07-16T17:40:00Z'))).toBe('18:40');
		expect(galway.time(at('2027-02-16T00:05:00Z'))).toBe('00:05');
	});

	it('name days of the gym, whatever zone the reader is in', () => {
		expect(galway.day(at('2027-02-15T23:30:00Z'))).toBe('Monday 15 February');
		expect(galway.date('2027-02-16')).toBe('Tuesday 16 February 2027');
		expect(galway.dayAndTime(at('2027-02-16T18:40:00Z'))).toBe('Tue 16 Feb, 18:40');
		expect([galway.weekday('2027-02-16'), galway.dayNumber('2027-02-16')]).toEqual([
			'Tuesday',
			'16'
		]);
	});

	it('write money from minor units, in the currency’s own number of them', () => {
		expect(galway.money(1400)).toBe('€14.00');
		const tokyo = createFormats({
			locale: 'en-GB',
			zone: 'Asia/Tokyo',
			currency: 'JPY',
			loadUnit: 'kg',
			weekStartsOn: 7
		});
		expect(tokyo.money(1400)).toBe('JP¥1,400');
	});

	it('write loads in the gym’s unit (1 lb = 0.45359237 kg, 1959 agreement)', () => {
		expect(galway.load(12.5)).toBe('12.5 kg');
		const texas = createFormats({
			locale: 'en-US',
			zone: 'America/Chicago',
			currency: 'USD',
			loadUnit: 'lb',
			weekStartsOn: 7
		});
		expect(texas.load(20)).toBe('44 lb');
		expect(texas.load(12.5)).toBe('27.5 lb');
	});
});
