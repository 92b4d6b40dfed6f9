import { dayBounds } from '$lib/domain/calendar/zone';
import type { Viewer } from '../guard';
import { library } from '../kit/library';
import { slotById, slotsBetween, slotsOfCoach, type SlotRow } from '../slots/queries';
import { mayTakeRoll, rollOf, type RollRow } from './queries';

const staff = { seesUnpublished: true };

/** The classes of a day of the gym, for the desk. */
export function classesOn(dayOn: string, zone: string): Promise<SlotRow[]> {
	const { startsAt, endsAt } = dayBounds(dayOn, zone);
	return slotsBetween(startsAt, endsAt, staff);
}

/** A coach's own classes from `fromAt` until just before `toAt`. */
export const classesOf = (coachId: number, fromAt: number, toAt: number): Promise<SlotRow[]> =>
	slotsOfCoach(coachId, fromAt, toAt, staff);

export type RollEntry = RollRow & {
	/** What they chose where it is not as written: "Ring row", with kilograms where they said. */
	choices: { name: string; kg: [number, number] | null }[];
};
export type RollPage = { slot: SlotRow; roll: RollEntry[] };

/** A class with its roll; null where there is none or it is not theirs to see. */
export async function rollPage(
	viewer: Pick<Viewer, 'personId' | 'capabilities'>,
	slotId: number
): Promise<RollPage | null> {
	if (!(await mayTakeRoll(viewer, slotId))) return null;
	const [slot, rows, lib] = await Promise.all([slotById(slotId, staff), rollOf(slotId), library()]);
	if (!slot) return null;
	const names = new Map(
		Object.values(lib.movements).flatMap(({ ladder }) => ladder.map(({ id, name }) => [id, name]))
	);
	return {
		slot,
		roll: rows.map((row) => ({
			...row,
			choices: Object.entries(row.variations).flatMap(([prescriptionId, variationId]) => {
				const name = names.get(variationId);
				return name ? { name, kg: row.loads[prescriptionId] ?? null } : [];
			})
		}))
	};
}

/** The class that the desk most likely wants: the one that runs or starts next, else the last. */
export function currentOf(classes: SlotRow[], now: number): SlotRow | null {
	const live = classes.filter(({ cancelledAt }) => cancelledAt === null);
	return live.find(({ endsAt }) => endsAt > now) ?? live.at(-1) ?? null;
}
