/** A slot that a series has already; `key` is its original local start "YYYY-MM-DDTHH:MM". */
export type Existing = {
	slotId: number;
	key: string;
	isCalledOff: boolean;
	/** Changed by hand since it was made. */
	isChanged: boolean;
};

export type Reshaped<Wanted> = {
	/** Takes the series' new time, room and coaches. */
	change: { slotId: number; wanted: Wanted }[];
	/** Only its key moves on: changed by hand, or called off. */
	keep: { slotId: number; wanted: Wanted }[];
	callOff: number[];
	/** Belongs to no date of the new rule but stays: changed by hand, or called off already. */
	letGo: number[];
	add: Wanted[];
};

/**
 * What becomes of a series' slots when its rule, time or room changes: dates are matched by day.
 * Slots changed by hand stay as they are unless `includeChanged`; what was called off stays so.
 * Both lists hold one entry a day at most.
 */
export function reshape<Wanted extends { key: string }>(
	existing: readonly Existing[],
	wanted: readonly Wanted[],
	{ includeChanged }: { includeChanged: boolean }
): Reshaped<Wanted> {
	const byDay = new Map(wanted.map((w) => [dayOf(w.key), w]));
	const plan: Reshaped<Wanted> = { change: [], keep: [], callOff: [], letGo: [], add: [] };
	for (const slot of existing) {
		const match = byDay.get(dayOf(slot.key));
		const stays = slot.isCalledOff || (slot.isChanged && !includeChanged);
		if (match) plan[stays ? 'keep' : 'change'].push({ slotId: slot.slotId, wanted: match });
		else plan[stays ? 'letGo' : 'callOff'].push(slot.slotId);
	}
	const taken = new Set(existing.map(({ key }) => dayOf(key)));
	plan.add = wanted.filter(({ key }) => !taken.has(dayOf(key)));
	return plan;
}

const dayOf = (key: string) => key.slice(0, 10);
