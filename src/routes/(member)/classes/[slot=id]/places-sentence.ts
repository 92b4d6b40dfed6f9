import * as m from '$lib/wording/compiled/messages';

/** What is free, or how many wait, in the words of the timetable. */
export default function placesSentence({ free, waitlisted }: { free: number; waitlisted: number }) {
	if (free === 1) return m.member_state_one_left();
	if (free === 2) return m.member_state_few({ free });
	if (free > 0) return m.member_state_open({ free });
	return waitlisted > 0
		? m.member_state_full() + m.member_state_and_waiting({ waiting: waitlisted })
		: m.member_state_full();
}
