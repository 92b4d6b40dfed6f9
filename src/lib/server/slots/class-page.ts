import { bookingWindow, coveringPass, cutOffAt, mayBook } from '$lib/domain/booking';
import { serveNewcomer } from '$lib/domain/kit';
import {
	claimantOf,
	type Block,
	type Prescription,
	type SessionContent
} from '$lib/domain/training';
import { liveBooking, type OwnBooking } from '../bookings/queries';
import { db } from '../db';
import type { Viewer } from '../guard';
import { kitRegister, type KitRegister } from '../kit/in-service';
import { library, type Library } from '../kit/library';
import { problemOf } from '../kit/plan';
import { usablePasses } from '../passes/queries';
import { slotFacts } from '../bookings/slot-facts';
import { planSlotsBetween } from './plan-slots';
import { slotById, type SlotRow } from './queries';

/** One way to do a movement, as a member chooses it. */
export type ChoiceOption = {
	variationId: number;
	name: string;
	isOpen: boolean;
	loadsKg: number[];
};

export type ClassStep = {
	prescriptionId: string;
	movement: string;
	variation: string;
	amount: Pick<Prescription, 'sets' | 'reps' | 'seconds' | 'metres' | 'calories' | 'perSide'>;
	tempo: string | null;
	/** Empty where there is one way only. */
	options: ChoiceOption[];
	asWrittenId: number;
	cautions: string;
};

export type ClassPage = {
	slot: SlotRow;
	about: string;
	aim: string;
	blocks: { id: string; kind: string; plan: Block; steps: ClassStep[] }[];
	cautions: { movement: string; text: string }[];
	mine: OwnBooking | null;
	cutOffAt: number;
	opensAt: number;
	/** Why it cannot be booked now; null where it can. */
	refused: string | null;
	/** What pays: null where nothing does, or nobody is signed in. */
	pays: { name: string; kind: 'membership' | 'pack'; left: number | null } | null;
};

/** Everything that a class's page shows to whoever looks. */
export async function classPage(
	slotId: number,
	viewer: Pick<Viewer, 'personId' | 'capabilities'> | null,
	{ now }: { now: number }
): Promise<ClassPage | null> {
	const slot = await slotById(slotId, { personId: viewer?.personId });
	const facts = await slotFacts(db, slotId);
	if (!slot || !facts) return null;
	const [lib, register, mine, passes] = await Promise.all([
		library(),
		kitRegister(slot.startsAt, slot.endsAt),
		viewer ? liveBooking(viewer.personId, slotId) : null,
		viewer ? usablePasses(viewer.personId, slot.startsOn, facts.weekStartsOn) : []
	]);
	const content = slot.session ? facts.content : null;
	const steps = content ? await stepsOf(slot, content, lib, register, mine?.id) : [];
	const window = bookingWindow(facts);
	const isStaff = viewer?.capabilities.has('schedule:read-all') ?? false;
	const may = mayBook({ ...facts, window, byStaff: false, isStaff, now, hasPass: true });
	const paysId = coveringPass(passes, slot.startsOn);
	const pays = passes.find(({ id }) => id === paysId) ?? null;
	const all = steps.flatMap((block) => block.steps);
	return {
		slot,
		about: facts.about,
		aim: content?.aim ?? '',
		blocks: steps,
		cautions: [...new Map(all.filter((s) => s.cautions).map((s) => [s.movement, s.cautions]))].map(
			([movement, text]) => ({ movement, text })
		),
		mine,
		cutOffAt: cutOffAt(facts),
		opensAt: window.opensAt,
		refused: may.ok ? null : may.refused,
		pays: pays && { name: pays.name, kind: pays.kind, left: pays.left }
	};
}

async function stepsOf(
	slot: SlotRow,
	content: SessionContent,
	lib: Library,
	register: KitRegister,
	ownBookingId: number | undefined
): Promise<ClassPage['blocks']> {
	const isServed = await servedIn(slot, content, lib, register, ownBookingId);
	return content.blocks.map((block) => ({
		id: block.id,
		kind: block.kind,
		plan: block,
		steps: block.prescriptions.flatMap((prescription) => {
			const step = stepOf(prescription, lib, register, isServed);
			return step ? [step] : [];
		})
	}));
}

function stepOf(
	prescription: Prescription,
	lib: Library,
	register: KitRegister,
	isServed: (prescriptionId: string, variationId: number) => boolean
): ClassStep | null {
	const movement = lib.movements[prescription.movementId];
	const written = movement?.ladder.find(({ id }) => id === prescription.variationId);
	if (!movement || !written) return null;
	const ways = movement.ladder.filter(({ archived, id }) => !archived || id === written.id);
	const {
		id: prescriptionId,
		sets,
		reps,
		seconds,
		metres,
		calories,
		perSide,
		tempo
	} = prescription;
	return {
		prescriptionId,
		movement: movement.name,
		variation: written.name,
		amount: { sets, reps, seconds, metres, calories, perSide },
		tempo: tempo ?? null,
		asWrittenId: written.id,
		cautions: movement.cautions,
		options:
			ways.length < 2
				? []
				: ways.map(({ id, name, needs }) => ({
						variationId: id,
						name,
						isOpen: isServed(prescriptionId, id),
						loadsKg: loadsFor(needs, prescription, lib, register)
					}))
	};
}

/** The loads that the gym has for a way, within what the session asks. */
function loadsFor(
	needs: { group: string }[],
	{ load }: Prescription,
	{ loadedGroups }: Library,
	register: KitRegister
): number[] {
	const group = needs.find((need) => loadedGroups.has(need.group))?.group;
	if (group === undefined) return [];
	const within = (kg: number) => load.kind === 'any' || (kg >= load.minKg && kg <= load.maxKg);
	const loads = register.items.flatMap(({ kitGroupId, loadKg, count }) =>
		String(kitGroupId) === group && loadKg !== null && count > 0 && within(loadKg) ? [loadKg] : []
	);
	return [...new Set(loads)].sort((a, b) => a - b);
}

/** Whether the kit serves one more person who takes this way at one station, the rest as written. */
async function servedIn(
	slot: SlotRow,
	content: SessionContent,
	lib: Library,
	register: KitRegister,
	ownBookingId: number | undefined
) {
	const around = await planSlotsBetween(slot.startsAt, slot.endsAt);
	const own = around.find(({ id }) => id === slot.id);
	if (!own) return () => true;
	own.people = own.people.filter(({ bookingId }) => bookingId !== ownBookingId);
	const problem = problemOf(around, lib, register);
	return (prescriptionId: string, variationId: number) => {
		const choices = { variations: { [prescriptionId]: variationId } };
		const person = claimantOf('asks', choices, content, lib.rules, lib.loadedGroups);
		const answer = serveNewcomer(problem, String(slot.id), person);
		return answer.served || (answer.offer !== null && !(prescriptionId in answer.offer));
	};
}
