/** Somebody who waits: the booking's number is its place in the line unless staff gave it another. */
export type Waiting = { bookingId: number; queueRank: number | null };

const rankOf = ({ bookingId, queueRank }: Waiting): number => queueRank ?? bookingId;

/** The line, first come first; equal ranks by booking. */
export const inLine = <W extends Waiting>(waiting: readonly W[]): W[] =>
	[...waiting].sort((a, b) => rankOf(a) - rankOf(b) || a.bookingId - b.bookingId);

/** 1 for the first in the line; null for who does not wait. */
export function positionOf(waiting: readonly Waiting[], bookingId: number): number | null {
	const at = inLine(waiting).findIndex((w) => w.bookingId === bookingId);
	return at < 0 ? null : at + 1;
}

/**
 * Who gets a place that came free: the first in the line who can be served. Those passed over come
 * back too, with why they could not be served, so that nobody is skipped silently.
 */
export function nextToServe<W extends Waiting, Why>(
	waiting: readonly W[],
	unservable: (waiting: W) => Why | null
): { next: W | null; passedOver: { waiting: W; why: Why }[] } {
	const passedOver: { waiting: W; why: Why }[] = [];
	for (const candidate of inLine(waiting)) {
		const why = unservable(candidate);
		if (why === null) return { next: candidate, passedOver };
		passedOver.push({ waiting: candidate, why });
	}
	return { next: null, passedOver };
}

/** Until the cut-off (included) an open place goes to the first in the line; after it, to the first who accepts. */
export const waitlistMode = (now: number, cutOffAt: number): 'promote' | 'first-to-accept' =>
	now <= cutOffAt ? 'promote' : 'first-to-accept';
