import { createFormats } from '$lib/wording/formats';
import type { Tx } from '../db';
import { gyms } from '../db/schema';
import { env } from '../env';
import type { BookingFacts } from '../messages/booking-letters';
import { queueMessage, type Letter } from '../messages/queue';

/** Mails somebody what became of their booking, where they have an address. One message a fact. */
export async function tellPerson(
	tx: Tx,
	person: { id: number; personId: number; name: string; email: string | null },
	slot: { id: number; className: string; startsAt: number },
	fact: string,
	letter: (facts: BookingFacts) => Letter,
	now: number
): Promise<void> {
	if (!person.email) return;
	const gym = await tx.select().from(gyms).get();
	if (!gym) return;
	const formats = createFormats(gym);
	await queueMessage(tx, {
		kind: `booking-${fact}`,
		to: person.email,
		personId: person.personId,
		factKey: `booking:${person.id}:${fact}:${now}`,
		now,
		...letter({
			name: person.name,
			gymName: gym.name,
			className: slot.className,
			day: formats.day(slot.startsAt),
			time: formats.time(slot.startsAt),
			href: `${env().origin}/classes/${slot.id}`
		})
	});
}
