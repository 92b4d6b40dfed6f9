import { describe, expect, it } from 'vitest';
import { addSlot, addSpecGym } from '../support/gym';
import { addPerson, testPassword } from '../support/people';
import { signedIn } from '../support/sign-in';
import { bookInto } from '../support/timetable';
import { useServer } from '../support/use-server';

/** Far enough ahead to be open, by the clock of the machine that runs this. */
const ahead = new Date(Date.now() + 3 * 86_400_000).toISOString().slice(0, 10);

describe('a member at the built server (goal G15, own and other people)', () => {
	const server = useServer(async () => {
		const gym = await addSpecGym();
		const slotId = await addSlot(gym, { on: ahead });
		const ann = await addPerson('ann@gym.test', ['member']);
		await addPerson('bob@gym.test', ['member']);
		await addPerson('desk@gym.test', ['front_desk']);
		await bookInto(slotId, [ann]);
	});
	const bookingOf = async (email: string) => {
		const client = await signedIn(server(), email, testPassword);
		const answer = await client(`/api/me/bookings?from=${ahead}&to=${ahead}`);
		const body = (await answer.json()) as { bookings: { id: number }[] };
		return { client, bookings: body.bookings };
	};

	it('sees their own bookings and nobody else’s', async () => {
		expect((await bookingOf('ann@gym.test')).bookings).toHaveLength(1);
		expect((await bookingOf('bob@gym.test')).bookings).toEqual([]);
	});

	it('cannot cancel another member’s booking: it is not there for them, and stays', async () => {
		const ann = await bookingOf('ann@gym.test');
		const bob = await bookingOf('bob@gym.test');
		const path = `/api/bookings/${ann.bookings[0]?.id}`;
		const answer = await bob.client(path, { method: 'DELETE' });
		expect([answer.status, (await answer.json()) as object]).toEqual([
			404,
			expect.objectContaining({ code: 'not-found' })
		]);
		expect((await bookingOf('ann@gym.test')).bookings).toEqual(ann.bookings);
	});

	it('cannot book for somebody else; the desk may cancel for anybody', async () => {
		const { client: bob } = await bookingOf('bob@gym.test');
		const forAnn = await bob('/api/slots/1/bookings', {
			method: 'POST',
			headers: { 'content-type': 'application/json' },
			body: JSON.stringify({ memberId: 3 })
		});
		expect(forAnn.status).toBe(403);

		const ann = await bookingOf('ann@gym.test');
		const desk = await signedIn(server(), 'desk@gym.test', testPassword);
		const gone = await desk(`/api/bookings/${ann.bookings[0]?.id}`, { method: 'DELETE' });
		expect(gone.status).toBe(200);
	});
});
