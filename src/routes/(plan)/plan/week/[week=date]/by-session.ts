/** A slot as the week shows it. */
export type PlannedSlot = {
	id: number;
	startsAt: number;
	endsAt: number;
	classType: string;
	room: string;
	coaches: string[];
	cancelledAt: number | null;
	publishedAt: number | null;
	places: { limit: number; limitedBy: string; booked: number; held: number; waitlisted: number };
	session: {
		id: number;
		title: string;
		blocks: {
			id: string;
			title: string;
			startS: number;
			endS: number;
			effort: 1 | 2 | 3 | 4 | 5;
		}[];
	} | null;
	shortages: { item: string; short: number; isForBooked: boolean }[];
	over: number;
};

export type SessionGroup = {
	key: string;
	session: PlannedSlot['session'];
	/** What stands for it where no session is laid. */
	classType: string;
	lengthS: number;
	slots: PlannedSlot[];
};

/** A day's slots by what is laid on them, in order of their first start; unlaid ones by class type. */
export function bySession(slots: readonly PlannedSlot[]): SessionGroup[] {
	const groups = new Map<string, SessionGroup>();
	for (const slot of slots) {
		const lengthS = (slot.endsAt - slot.startsAt) / 1000;
		const what = slot.session ? `session ${slot.session.id}` : `type ${slot.classType}`;
		const key = `${what} ${lengthS}`;
		const { session, classType } = slot;
		const group = groups.get(key) ?? { key, session, classType, lengthS, slots: [] };
		groups.set(key, { ...group, slots: [...group.slots, slot] });
	}
	return [...groups.values()];
}
