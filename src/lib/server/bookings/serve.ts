import { serveNewcomer } from '$lib/domain/kit';
import { claimantOf, type Choices } from '$lib/domain/training';
import type { Tx } from '../db';
import { kitRegister } from '../kit/in-service';
import { libraryAt, type Library } from '../kit/library';
import { problemOf, type PlanSlot } from '../kit/plan';
import { limitsOf } from '../slots/places';
import { planSlotsBetween } from '../slots/plan-slots';
import type { SlotFacts } from './slot-facts';

/**
 * Whether one more person finds a place: room, coach and hand first, then the kit as chosen.
 * `offer` has variation ids by prescription: what they could do instead, where the kit is short.
 */
export type PlaceAnswer =
	{ free: true } | { free: false; why: 'full' | 'kit'; offer: Record<string, number> | null };

export async function findPlace(
	tx: Tx,
	slot: SlotFacts,
	choices: Choices,
	leaveOut?: number
): Promise<PlaceAnswer> {
	const around = await planSlotsBetween(slot.startsAt, slot.endsAt, tx);
	const own = around.find(({ id }) => id === slot.id);
	if (!own) return { free: false, why: 'full', offer: null };
	if (leaveOut !== undefined) own.people = own.people.filter((p) => p.bookingId !== leaveOut);
	if (own.people.length >= mostPeople(slot)) return { free: false, why: 'full', offer: null };
	return askKit(own, around, choices, await libraryAt(slot.libraryVersion), tx);
}

/** The least of room, coaches and a number set by hand. */
export function mostPeople(slot: SlotFacts): number {
	const { room, ratio, coaches, set } = limitsOf(slot);
	return Math.min(
		room,
		ratio === null || coaches === null ? Infinity : ratio * coaches,
		set ?? Infinity
	);
}

async function askKit(
	own: PlanSlot,
	around: PlanSlot[],
	choices: Choices,
	lib: Library,
	tx: Tx
): Promise<PlaceAnswer> {
	const register = await kitRegister(own.startsAt, own.endsAt, tx);
	const problem = problemOf(around, lib, register);
	const newcomer = own.content
		? claimantOf('newcomer', choices, own.content, lib.rules, lib.loadedGroups)
		: { id: 'newcomer', variations: {}, loads: {} };
	const answer = serveNewcomer(problem, String(own.id), newcomer);
	if (answer.served) return { free: true };
	const offer = answer.offer && own.content ? namedOffer(answer.offer, own, lib) : null;
	return { free: false, why: 'kit', offer };
}

/** Rungs of stations as variation ids of prescriptions. */
function namedOffer(offer: Record<string, number>, own: PlanSlot, lib: Library) {
	const prescriptions = own.content!.blocks.flatMap((block) => block.prescriptions);
	return Object.fromEntries(
		Object.entries(offer).map(([id, rung]) => {
			const movementId = prescriptions.find((p) => p.id === id)!.movementId;
			return [id, lib.movements[movementId]!.ladder[rung]!.id];
		})
	);
}
