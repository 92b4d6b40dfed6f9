import * as m from '$lib/wording/compiled/messages';
import type { Formats } from '$lib/wording/formats';

type Becomes =
	| { what: 'called-off' }
	| { what: 'changed'; startsAt: number; endsAt: number; room: string | null; coaches: boolean }
	| { what: 'laid'; loses: number[] }
	| { what: 'fewer-places'; places: number };

type SeenSlot = {
	slotId: number;
	title: string;
	startsAt: number;
	endsAt: number;
	becomes: Becomes;
	people: {
		bookingId: number;
		personId: number;
		name: string;
		email: string | null;
		status: 'held' | 'booked' | 'waitlisted';
		/** Another class of theirs at the new time. */
		elsewhere: string | null;
	}[];
};

/** What a change does, as the server worked it out: slots with people, and clashes. */
export type SeenSight = {
	affected: SeenSlot[];
	clashes: {
		kind: 'room' | 'coach';
		name: string;
		other: { title: string; startsAt: number; endsAt: number };
	}[];
	seen: string;
};

/** How many different people it concerns. */
export const peopleCount = ({ affected }: Pick<SeenSight, 'affected'>): number =>
	new Set(affected.flatMap(({ people }) => people.map(({ personId }) => personId))).size;

/** "moves to Mon 7 Dec, 19:00, in the Loft". */
export function becomesSentence(slot: SeenSlot, formats: Formats): string {
	const { becomes } = slot;
	if (becomes.what === 'called-off') return m.plan_becomes_called_off();
	if (becomes.what === 'laid') return m.plan_becomes_laid();
	if (becomes.what === 'fewer-places') {
		return m.plan_becomes_fewer({ places: becomes.places, people: slot.people.length });
	}
	const moved = becomes.startsAt !== slot.startsAt || becomes.endsAt !== slot.endsAt;
	return [
		moved
			? m.plan_becomes_moved({
					when: formats.dayAndTime(becomes.startsAt),
					to: formats.time(becomes.endsAt)
				})
			: '',
		becomes.room ? m.plan_becomes_room({ room: becomes.room }) : '',
		becomes.coaches ? m.plan_becomes_coach() : ''
	]
		.filter(Boolean)
		.join(', ');
}
