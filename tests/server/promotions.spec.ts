import { asc } from 'drizzle-orm';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { book } from '../../src/lib/server/bookings/book';
import { cancel } from '../../src/lib/server/bookings/cancel';
import { giveToWaiting } from '../../src/lib/server/bookings/give';
import { db } from '../../src/lib/server/db';
import { bookingChanges, bookings } from '../../src/lib/server/db/schema';
import { useDatabase } from '../support/database';
import { acting, addMembers, addSlot, addSpecGym, specNow } from '../support/gym';

const places = 12;
const people = 100;

type Change = { bookingId: number; fromStatus: string | null; toStatus: string };

/** What the order of changes says went wrong: a place too many at any moment, or two promotions of one. */
function faultsOf(changes: readonly Change[]): string[] {
	const faults: string[] = [];
	const promoted = new Set<number>();
	let booked = 0;
	for (const { bookingId, fromStatus, toStatus } of changes) {
		if (fromStatus === 'booked') booked -= 1;
		if (toStatus === 'booked') booked += 1;
		if (booked > places) faults.push(`${booked} in at once`);
		if (fromStatus === 'waitlisted' && toStatus === 'booked') {
			if (promoted.has(bookingId)) faults.push(`${bookingId} promoted twice`);
			promoted.add(bookingId);
		}
	}
	return faults;
}

describe('a hundred who cancel while the desk gives places by hand (goal G2)', () => {
	useDatabase();

	it.each([20261201, Date.now()])(
		'never are more than twelve in, nor one promoted twice (seed %i)',
		async (seed) => {
			const gym = await addSpecGym({ barPlaces: 40 });
			const slotId = await addSlot(gym, { setPlaces: places });
			const members = await addMembers(people);
			const ids: { id: number; personId: number }[] = [];
			for (const personId of members) {
				const got = await book(acting(personId), slotId, { now: specNow });
				if (got.ok) ids.push({ id: got.booking.id, personId });
			}
			expect(ids).toHaveLength(people);

			const desk = acting(gym.deskId, 'front_desk');
			const order = fc.sample(fc.shuffledSubarray(ids, { minLength: people }), {
				seed,
				numRuns: 1
			})[0]!;
			await Promise.all(
				order.flatMap(({ id, personId }, i) => [
					cancel(acting(personId), id, { now: specNow }),
					giveToWaiting(desk, slotId, {
						bookingId: order[(i * 7 + 3) % people]!.id,
						now: specNow
					})
				])
			);

			const changes = await db.select().from(bookingChanges).orderBy(asc(bookingChanges.id));
			expect(faultsOf(changes)).toEqual([]);
			const left = await db.select().from(bookings);
			expect(left.filter(({ status }) => status !== 'cancelled')).toEqual([]);
		}
	);

	it('would be found out', () => {
		const entered = (bookingId: number): Change => ({
			bookingId,
			fromStatus: null,
			toStatus: 'booked'
		});
		expect(faultsOf(Array.from({ length: 13 }, (_, i) => entered(i)))).toEqual(['13 in at once']);
		const up = { bookingId: 1, fromStatus: 'waitlisted', toStatus: 'booked' };
		const down = { bookingId: 1, fromStatus: 'booked', toStatus: 'waitlisted' };
		expect(faultsOf([up, down, up])).toEqual(['1 promoted twice']);
	});
});
