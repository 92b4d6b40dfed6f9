import * as m from '$lib/wording/compiled/messages';
import type { PlannedSlot } from './by-session';

/** Percent of the places that are taken. */
export const fillOf = ({ booked, held, limit }: PlannedSlot['places']): number =>
	limit === 0 ? 100 : Math.min(100, ((booked + held) / limit) * 100);

/** "TW" for Tomasz Wrona. */
export const initialsOf = (name: string): string => {
	const parts = name.split(/\s+/).filter(Boolean);
	return [parts.at(0), parts.length > 1 ? parts.at(-1) : undefined]
		.map((part) => part?.[0]?.toLocaleUpperCase() ?? '')
		.join('');
};

export function placesSentence({ cancelledAt, places }: PlannedSlot): string {
	if (cancelledAt !== null) return m.plan_called_off();
	const { booked, held, limit, waitlisted } = places;
	return m.plan_places_sentence({ taken: booked + held, limit, waiting: waitlisted });
}
