export type GaugeMark = 'in' | 'booked' | 'held' | 'free' | 'beyond';

export type GaugeCount = {
	/** People checked in; part of `booked`. */
	attended?: number;
	booked: number;
	held?: number;
	/** Places that can be had, the binding limit. */
	limit: number;
	/** What the room would take; places past the kit are hatched up to it. Staff only. */
	roomFor?: number;
	waiting?: number;
};

/** One mark a place, in order: came, booked, held, free, then what the kit does not serve. */
export function gaugeMarks({
	attended = 0,
	booked,
	held = 0,
	limit,
	roomFor
}: GaugeCount): GaugeMark[] {
	const taken = booked + held;
	const free = Math.max(0, limit - taken);
	const beyond = Math.max(0, (roomFor ?? limit) - Math.max(limit, taken));
	return [
		...Array<GaugeMark>(attended).fill('in'),
		...Array<GaugeMark>(Math.max(0, booked - attended)).fill('booked'),
		...Array<GaugeMark>(held).fill('held'),
		...Array<GaugeMark>(free).fill('free'),
		...Array<GaugeMark>(beyond).fill('beyond')
	];
}
