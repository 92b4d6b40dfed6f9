/** One block of a ribbon on the timetable: seconds from the start, effort 1 (easy) to 5 (all out). */
export type TimetableBlock = { title: string; startS: number; endS: number; effort: number };

/** What the timetable draws of a slot: the API's `Slot`, with what belongs to the one who looks. */
export type TimetableSlot = {
	id: number;
	startsAt: string;
	endsAt: string;
	title: string;
	classType: { id: number; name: string };
	room: { id: number; name: string };
	coaches: { id: number; name: string }[];
	status: 'scheduled' | 'cancelled';
	places: {
		limit: number;
		limitedBy: string;
		booked: number;
		held: number;
		waitlisted: number;
		free: number;
	};
	blocks?: TimetableBlock[];
	myBooking?: { id: number; status: string; position?: number };
};

/** Minute of the gym's day; the API writes instants with the gym's own offset. */
export const minuteOfDay = (iso: string): number =>
	Number(iso.slice(11, 13)) * 60 + Number(iso.slice(14, 16));

export const dayOf = (iso: string): string => iso.slice(0, 10);
export const clockOf = (iso: string): string => iso.slice(11, 16);

export const minutesLong = (slot: Pick<TimetableSlot, 'startsAt' | 'endsAt'>): number =>
	Math.round((Date.parse(slot.endsAt) - Date.parse(slot.startsAt)) / 60_000);

/** What a class is to the one who looks; decides its words and its colour. */
export type SlotState =
	| { kind: 'cancelled' }
	| { kind: 'in' }
	| { kind: 'came' }
	| { kind: 'waiting'; position: number | null }
	| { kind: 'held' }
	| { kind: 'running' }
	| { kind: 'done' }
	| { kind: 'full'; waiting: number }
	| { kind: 'few'; free: number }
	| { kind: 'open'; free: number };

/** @param now epoch ms */
export function stateOf(slot: TimetableSlot, now: number): SlotState {
	const mine = slot.myBooking?.status;
	if (slot.status === 'cancelled') return { kind: 'cancelled' };
	if (mine === 'attended') return { kind: 'came' };
	if (Date.parse(slot.endsAt) <= now) return { kind: 'done' };
	if (mine === 'booked') return { kind: 'in' };
	if (mine === 'held') return { kind: 'held' };
	if (mine === 'waitlisted') return { kind: 'waiting', position: slot.myBooking?.position ?? null };
	if (Date.parse(slot.startsAt) <= now) return { kind: 'running' };
	const { free, waitlisted } = slot.places;
	if (free <= 0) return { kind: 'full', waiting: waitlisted };
	return free <= 2 ? { kind: 'few', free } : { kind: 'open', free };
}
