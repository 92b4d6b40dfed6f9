import { occurrences, type Occurrence } from '$lib/domain/calendar';

export type { Occurrence } from '$lib/domain/calendar';

/** What a series' dates follow from. */
export type SeriesTimes = {
	startsOn: string;
	startTime: string;
	lengthMin: number;
	rule: string;
};

type Between = { zone: string; fromOn: string; toOn: string; atMost?: number };

/** More than a daily rule has in three years. */
const usual = 1200;

/**
 * The dates of a stored series in a range of civil days, both included.
 * @throws where its rule cannot be read: it was read before it was stored
 */
export function expand(
	{ startsOn, startTime, lengthMin, rule }: SeriesTimes,
	{ zone, fromOn, toOn, atMost = usual }: Between
): Occurrence[] {
	const startLocal = `${startsOn}T${startTime}`;
	const read = occurrences({ startLocal, zone, rule, lengthMin, fromOn, toOn, limit: atMost });
	if (read.ok) return read.occurrences;
	if (read.refused === 'ends-before-start') return [];
	throw new Error(`series with a rule that cannot be read: ${read.refused}`);
}
