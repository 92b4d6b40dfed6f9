import * as m from '$lib/wording/compiled/messages';

/** What decides how many a class takes. */
export const limitWords = (limitedBy: 'room' | 'coach' | 'set' | 'kit'): string =>
	({
		room: m.plan_limit_room(),
		coach: m.plan_limit_coach(),
		set: m.plan_limit_set(),
		kit: m.plan_limit_kit()
	})[limitedBy];
