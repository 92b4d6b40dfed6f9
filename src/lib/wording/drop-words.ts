import type { DropSaid } from '$lib/domain/training';
import * as m from './compiled/messages';

/** A drop rule as a sentence: "Below 5 reps, go on with: band-assisted pull-up." and the coach's note. */
export function dropWords({ belowReps: reps, toName: to, note }: DropSaid): string {
	const said = to ? m.session_drop_to({ reps, to }) : m.session_drop_end({ reps });
	return note ? m.session_drop_with_note({ said, note }) : said;
}
