import { occurrences } from '../../src/lib/domain/calendar';
import type { Figure } from './run';

const days = ['MO', 'TU', 'WE', 'TH', 'FR', 'SA'];
const times = ['06:30', '09:30', '12:15', '17:30', '18:40'];

/** Fifty series of a gym that changes its clocks: one to three days a week, some every second week. */
const series = Array.from({ length: 50 }, (_, i) => ({
	startLocal: `2026-01-05T${times[i % times.length]}`,
	zone: 'Europe/Dublin',
	rule: `FREQ=WEEKLY${i % 10 === 9 ? ';INTERVAL=2' : ''};BYDAY=${days.slice(i % 4, (i % 4) + 1 + (i % 3)).join(',')}`,
	lengthMin: 60,
	toOn: '2027-01-03'
}));

const expandAll = (): number =>
	series.reduce((slots, asked) => {
		const read = occurrences(asked);
		if (!read.ok) throw new Error(read.refused);
		return slots + read.occurrences.length;
	}, 0);

/** A year of slots for 50 series: the median of seven runs, after one to warm up. */
export function benchCalendar(): Figure[] {
	const slots = expandAll();
	const runs = Array.from({ length: 7 }, () => {
		const start = performance.now();
		expandAll();
		return performance.now() - start;
	}).sort((a, b) => a - b);
	return [{ name: `a year of ${slots} slots for 50 series`, value: runs[3]!, unit: 'ms' }];
}
