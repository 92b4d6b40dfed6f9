import { refuse, type Refused } from '../refusal';

export type WhoMayBook = 'anyone' | 'pass-holders' | 'staff';

export type Asked = {
	now: number;
	/** The slot's start and end, epoch ms. */
	startsAt: number;
	endsAt: number;
	cancelledAt: number | null;
	window: { opensAt: number; closesAt: number };
	whoMayBook: WhoMayBook;
	/** The desk books for somebody: outside the window too, until the class ends, whoever may book. */
	byStaff: boolean;
	/** The person holds a pass that is in date on the day. */
	hasPass: boolean;
	/** The person works here. */
	isStaff?: boolean;
};

export type MayNotBook = Refused<
	'cancelled' | 'past' | 'not-open-yet' | 'closed' | 'pass-holders-only' | 'staff-only'
>;

/** Whether a place in a slot may be asked for at all; places and payment are looked at after. */
export function mayBook(asked: Asked): { ok: true } | MayNotBook {
	const { now, startsAt, endsAt, cancelledAt, window, whoMayBook, byStaff, hasPass } = asked;
	if (cancelledAt !== null) return refuse('cancelled');
	if (now >= (byStaff ? endsAt : startsAt)) return refuse('past');
	if (byStaff) return { ok: true };
	if (now < window.opensAt) return refuse('not-open-yet');
	if (now > window.closesAt) return refuse('closed');
	if (whoMayBook === 'staff' && !asked.isStaff) return refuse('staff-only');
	if (whoMayBook === 'pass-holders' && !hasPass) return refuse('pass-holders-only');
	return { ok: true };
}

type Span = { startsAt: number; endsAt: number };

/** The first of somebody's bookings that overlaps a slot. Bookings may touch: one may end as the next starts. */
export const overlapping = <B extends Span>(slot: Span, booked: readonly B[]): B | null =>
	booked.find((other) => other.startsAt < slot.endsAt && slot.startsAt < other.endsAt) ?? null;
