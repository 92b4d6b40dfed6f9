import { createFormats } from '$lib/wording/formats';
import * as m from '$lib/wording/compiled/messages';
import type { Tx } from '../db';
import { env } from '../env';
import type { Gym } from '../gym/queries';
import { setLetter } from '../messages/letter';
import { queueMessage } from '../messages/queue';
import type { AffectedPerson, AffectedSlot } from './affected';

type Telling = {
	gym: Gym;
	/** Said to the people concerned, in the words of whoever decides. */
	why: string | null;
	/** Names the change: one letter a person and change. */
	fact: string;
	now: number;
};

/**
 * Queues one letter to each person who counts on these slots, with every class of theirs that
 * changes. Somebody without an address gets none; the person who decided saw who that is.
 * @returns how many letters were queued
 */
export async function tellPeople(
	tx: Tx,
	affected: readonly AffectedSlot[],
	{ gym, why, fact, now }: Telling
): Promise<number> {
	let told = 0;
	for (const { person, lines } of byPerson(affected, gym)) {
		if (!person.email) continue;
		const letter = setLetter({
			subject: m.plan_mail_subject({ gym: gym.name }),
			greeting: m.account_mail_greeting({ name: person.name }),
			paragraphs: [...lines, ...(why ? [m.plan_mail_why({ why })] : [])],
			button: { label: m.plan_mail_button(), href: `${env().origin}/booked` },
			gymName: gym.name
		});
		const factKey = `${fact}:person:${person.personId}`;
		const to = { to: person.email, personId: person.personId };
		await queueMessage(tx, { kind: 'class-changed', factKey, now, ...to, ...letter });
		told += 1;
	}
	return told;
}

function byPerson(affected: readonly AffectedSlot[], gym: Gym) {
	const letters = new Map<number, { person: AffectedPerson; lines: string[] }>();
	for (const slot of affected) {
		for (const person of slot.people) {
			const line = lineFor(slot, person, gym);
			if (!line) continue;
			const letter = letters.get(person.personId) ?? { person, lines: [] };
			letters.set(person.personId, { ...letter, lines: [...letter.lines, line] });
		}
	}
	return letters.values();
}

/** What becomes of one class for one person; null where it does not concern them. */
function lineFor(slot: AffectedSlot, person: AffectedPerson, gym: Gym): string | null {
	const { title, becomes } = slot;
	const { day, from, to } = whenOf(slot, gym);
	if (becomes.what === 'called-off') {
		const facts = { title, day, from, to };
		return person.status === 'waitlisted'
			? m.plan_mail_called_off_waiting(facts)
			: m.plan_mail_called_off(facts);
	}
	if (becomes.what === 'laid') {
		const loses = becomes.loses.includes(person.bookingId);
		return loses ? m.plan_mail_choices({ title, day, from }) : null;
	}
	if (becomes.what === 'fewer-places') return null;
	const after = whenOf(becomes, gym);
	const moved = becomes.startsAt !== slot.startsAt || becomes.endsAt !== slot.endsAt;
	const said = [
		m.plan_mail_was({ title, day, from, to }),
		...(moved ? [m.plan_mail_moved(after)] : []),
		...(becomes.room ? [m.plan_mail_room({ room: becomes.room })] : []),
		...(becomes.coaches ? [m.plan_mail_coach()] : [])
	];
	return said.length > 1 ? said.join(' ') : null;
}

/** "Tuesday 1 December", "18:40", "19:40" on the gym's clock. */
function whenOf({ startsAt, endsAt }: { startsAt: number; endsAt: number }, gym: Gym) {
	const formats = createFormats(gym);
	return {
		day: formats.day(startsAt),
		from: formats.time(startsAt),
		to: formats.time(endsAt)
	};
}
