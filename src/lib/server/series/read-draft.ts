import { readRule } from '$lib/domain/calendar';
import { refuse, type Refused } from '$lib/domain/refusal';
import type { SeriesDraft } from '$lib/forms/series';
import { pickedRuleText } from '$lib/domain/calendar/picked-rule';
import type { Queryable } from '../db';
import { missingFrom } from './check';

/** The columns of a series that a draft means. */
export type SeriesColumns = {
	classTypeId: number;
	roomId: number;
	startsOn: string;
	startTime: string;
	lengthMin: number;
	rule: string;
	setPlaces: number | null;
};

export type DraftRefusal = Refused<
	| 'rule-unreadable'
	| 'ends-before-start'
	| 'unknown-class-type'
	| 'unknown-room'
	| 'unknown-coach'
	| 'no-days'
>;

/** Reads a draft, or says why it cannot be: its rule first, then what it names. */
export async function readSeriesDraft(
	draft: SeriesDraft,
	{ weekStartsOn }: { weekStartsOn: number },
	q: Queryable
): Promise<{ ok: true; columns: SeriesColumns; coachIds: number[] } | DraftRefusal> {
	const rule = pickedRuleText(draft, draft.startsOn, weekStartsOn);
	if (!rule.ok) return rule;
	const read = readRule(rule.text);
	if (!read.ok) return read;
	if (draft.ends === 'until' && draft.untilOn && draft.untilOn < draft.startsOn) {
		return refuse('ends-before-start');
	}
	const missing = await missingFrom(draft, q);
	if (missing) return missing;
	return {
		ok: true,
		coachIds: draft.coachIds,
		columns: {
			classTypeId: draft.classTypeId,
			roomId: draft.roomId,
			startsOn: draft.startsOn,
			startTime: draft.startTime,
			lengthMin: draft.lengthMin,
			rule: rule.text,
			setPlaces: draft.setPlaces ?? null
		}
	};
}
