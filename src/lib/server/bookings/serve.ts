import { serveNewcomer, type Problem } from '$lib/domain/kit';
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
	return (await roomIn(tx, slot, leaveOut)).for(choices);
}

/** A slot as it stands, read once: whom it could serve besides those in it. */
export type RoomIn = {
	for(choices: Choices): PlaceAnswer;
	/** Counts somebody who was given a place since. */
	take(person: { id: number } & Choices): void;
};

/** Reads what `findPlace` asks about, for who asks for several people in turn. */
export async function roomIn(tx: Tx, slot: SlotFacts, leaveOut?: number): Promise<RoomIn> {
	const [around, register, lib] = await Promise.all([
		planSlotsBetween(slot.startsAt, slot.endsAt, tx),
		kitRegister(slot.startsAt, slot.endsAt, tx),
		libraryAt(slot.libraryVersion)
	]);
	const own = around.find(({ id }) => id === slot.id);
	if (own && leaveOut !== undefined) {
		own.people = own.people.filter(({ bookingId }) => bookingId !== leaveOut);
	}
	/** Choices that the kit did not serve: it serves them no better once more people are in. */
	const unserved = new Map<string, PlaceAnswer>();
	return {
		for(choices) {
			if (!own || own.people.length >= mostPeople(slot)) {
				return { free: false, why: 'full', offer: null };
			}
			const { variations, loads } = choices;
			const key = JSON.stringify([variations, loads]);
			const answer =
				unserved.get(key) ?? askKit(own, problemOf(around, lib, register), choices, lib);
			if (!answer.free) unserved.set(key, answer);
			return answer;
		},
		take({ id, variations, loads }) {
			own?.people.push({ bookingId: id, choices: { variations, loads } });
		}
	};
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

function askKit(own: PlanSlot, problem: Problem, choices: Choices, lib: Library): PlaceAnswer {
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
