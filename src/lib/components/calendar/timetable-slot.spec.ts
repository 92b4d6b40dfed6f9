import { describe, expect, it } from 'vitest';
import {
	clockOf,
	dayOf,
	minuteOfDay,
	minutesLong,
	stateOf,
	type TimetableSlot
} from './timetable-slot';

const slot: TimetableSlot = {
	id: 1,
	startsAt: '2026-12-01T18:40:00+00:00',
	endsAt: '2026-12-01T19:40:00+00:00',
	title: 'Hinge & carry',
	classType: { id: 1, name: 'Strength' },
	room: { id: 1, name: 'Long Floor' },
	coaches: [],
	status: 'scheduled',
	places: { limit: 16, limitedBy: 'kit', booked: 10, held: 0, waitlisted: 0, free: 6 }
};
const before = Date.parse('2026-12-01T17:00:00Z');
const after = Date.parse('2026-12-01T20:00:00Z');
const mine = (status: string, position?: number) => ({
	...slot,
	myBooking: { id: 7, status, ...(position ? { position } : {}) }
});

describe('what a class is to the one who looks', () => {
	it('reads the gym’s own clock out of the instant, whatever zone the reader is in', () => {
		expect([dayOf(slot.startsAt), clockOf(slot.startsAt)]).toEqual(['2026-12-01', '18:40']);
		expect(minuteOfDay('2026-07-01T06:30:00+01:00')).toBe(390);
		expect(minutesLong(slot)).toBe(60);
	});

	it.each([
		[
			'a cancelled class stays cancelled, even for who was in',
			{ ...mine('booked'), status: 'cancelled' as const },
			before,
			{ kind: 'cancelled' }
		],
		['who booked is in', mine('booked'), before, { kind: 'in' }],
		['who waits sees the turn', mine('waitlisted', 2), before, { kind: 'waiting', position: 2 }],
		['who was there came', mine('attended'), after, { kind: 'came' }],
		['what is over is done', slot, after, { kind: 'done' }],
		['six places are open', slot, before, { kind: 'open', free: 6 }],
		[
			'two places are few',
			{ ...slot, places: { ...slot.places, free: 2 } },
			before,
			{ kind: 'few', free: 2 }
		],
		[
			'none free is full',
			{ ...slot, places: { ...slot.places, free: 0, waitlisted: 3 } },
			before,
			{ kind: 'full', waiting: 3 }
		]
	])('%s', (_rule, given, now, expected) => {
		expect(stateOf(given, now)).toEqual(expected);
	});
});
