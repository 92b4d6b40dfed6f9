const minute = 60_000;
/** Waits after each failed try: quick at first, then for servers that are down for a day. */
const waits = [minute, 5 * minute, 15 * minute, 60 * minute, 4 * 60 * minute, 12 * 60 * minute];

/** When to try again after `attempts` failures, as an instant; null when it is time to give up. */
export function nextAttempt(attempts: number, now: number): number | null {
	const wait = waits[attempts - 1];
	return wait === undefined ? null : now + wait;
}
