import { randomInt } from 'node:crypto';
import { book } from '../../src/lib/server/bookings/book';
import { cancel } from '../../src/lib/server/bookings/cancel';
import { openDatabase } from '../../src/lib/server/db';
import { acting, specNow } from './gym';

/**
 * Books and cancels without end on the database file it is given, and says what was acknowledged,
 * one JSON line each, after the command answered. Killed by its parent at some moment.
 */
const [file = '', members = '', slots = ''] = process.argv.slice(2);
const memberIds = members.split(',').map(Number);
const slotIds = slots.split(',').map(Number);
const say = (line: object) => process.stdout.write(`${JSON.stringify(line)}\n`);
const any = (ids: number[]) => ids[randomInt(ids.length)]!;

await openDatabase(`file:${file}`);
const live: { id: number; personId: number }[] = [];
for (;;) {
	const personId = any(memberIds);
	if (live.length > 0 && randomInt(3) === 0) {
		const [booking] = live.splice(randomInt(live.length), 1);
		const gone = await cancel(acting(booking!.personId), booking!.id, { now: specNow });
		if (gone.ok) say({ cancelled: booking!.id, promoted: gone.promoted.map((p) => p.bookingId) });
		continue;
	}
	const got = await book(acting(personId), any(slotIds), { now: specNow });
	if (!got.ok) continue;
	live.push({ id: got.booking.id, personId });
	say({ booked: got.booking.id, status: got.booking.status });
}
