import { dayBounds } from '$lib/domain/calendar/zone';
import type { SessionContent } from '$lib/domain/training';
import type { Viewer } from '../guard';
import { library, type Library } from '../kit/library';
import { revisionContents } from '../slots/plan-slots';
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
	/** What they chose, in the session's order: "Ring row", with kilograms where they said. */
	choices: { name: string; kg: [number, number] | null }[];
};
export type RollPage = { slot: SlotRow; roll: RollEntry[] };

/** A class with its roll, without what people tell their coaches; null where it is not theirs to see. */
export async function rollPage(
	viewer: Pick<Viewer, 'personId' | 'capabilities'>,
	slotId: number
): Promise<RollPage | null> {
	const page = await rollWithNotes(viewer, slotId);
	return (
		page && { ...page, roll: page.roll.map((row) => ({ ...row, note: null, personNote: null })) }
	);
}

/** The same with what people tell their coaches, for those who coach it. */
export async function rollWithNotes(
	viewer: Pick<Viewer, 'personId' | 'capabilities'>,
	slotId: number
): Promise<RollPage | null> {
	if (!(await mayTakeRoll(viewer, slotId))) return null;
	const [slot, rows, lib] = await Promise.all([slotById(slotId, staff), rollOf(slotId), library()]);
	if (!slot) return null;
	const { revisionId } = slot;
	const content =
		revisionId === null ? undefined : (await revisionContents([revisionId])).get(revisionId);
	return { slot, roll: rows.map((row) => ({ ...row, choices: chosenIn(row, content, lib) })) };
}

/** Variations that are not as written, and loads; choices of an earlier session are not shown. */
function chosenIn(
	{ variations, loads }: Pick<RollRow, 'variations' | 'loads'>,
	content: SessionContent | undefined,
	lib: Library
): RollEntry['choices'] {
	const prescriptions = content?.blocks.flatMap((block) => block.prescriptions) ?? [];
	return prescriptions.flatMap(({ id, movementId, variationId }) => {
		const kg = loads[id] ?? null;
		const chosenId = variations[id] ?? variationId;
		if (chosenId === variationId && kg === null) return [];
		const name = lib.movements[movementId]?.ladder.find((rung) => rung.id === chosenId)?.name;
		return name ? [{ name, kg }] : [];
	});
}

/** The class that the desk most likely wants: the one that runs or starts next, else the last. */
export function currentOf(classes: SlotRow[], now: number): SlotRow | null {
	const live = classes.filter(({ cancelledAt }) => cancelledAt === null);
	return live.find(({ endsAt }) => endsAt > now) ?? live.at(-1) ?? null;
}
