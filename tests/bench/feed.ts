import { writeCalendar } from '../../src/lib/server/feeds/calendar';
import type { FeedEntry } from '../../src/lib/server/feeds/queries';
import type { Figure } from './run';

const day = 86_400_000;

/** One feed of 300 slots, written out: the median of twenty. */
export async function benchFeed(): Promise<Figure[]> {
	const entries: FeedEntry[] = Array.from({ length: 300 }, (_, i) => ({
		id: i + 1,
		uid: `slot-${i}`,
		startsAt: Date.UTC(2026, 11, 1, 18, 40) + i * day,
		endsAt: Date.UTC(2026, 11, 1, 19, 40) + i * day,
		title: 'Tempo squat & row, long name; with signs',
		room: 'Long Floor',
		coaches: 'Niamh Corrigan, Tomasz Wilk',
		cancelledAt: i % 20 === 0 ? 1 : null,
		sequence: i % 3,
		createdAt: 1,
		modifiedAt: 2,
		status: null
	}));
	const facts = { name: 'Ropewalk Strength', origin: 'http://localhost', host: 'localhost' };
	const times: number[] = [];
	for (let i = 0; i < 20; i += 1) {
		const started = performance.now();
		writeCalendar(entries, facts);
		times.push(performance.now() - started);
	}
	const median = times.sort((a, b) => a - b)[10]!;
	return [{ name: 'a feed of 300 slots', value: median, unit: 'ms' }];
}
