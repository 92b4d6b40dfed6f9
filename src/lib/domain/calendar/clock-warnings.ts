import type { Occurrence } from './occurrences';
import { clockChangeAt } from './zone';

/** Occurrences whose wall-clock time a clock change skips (`skipped`) or brings twice (`twice`), for the editor to warn of. */
export function clockWarnings(
	occurrences: readonly Occurrence[],
	zone: string
): { occurrence: Occurrence; change: 'skipped' | 'twice' }[] {
	return occurrences.flatMap((occurrence) => {
		const change = occurrence.isInGap ? 'skipped' : clockChangeAt(occurrence.localStart, zone);
		return change ? [{ occurrence, change }] : [];
	});
}
