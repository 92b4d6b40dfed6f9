import { serveNewcomer, shortages, type Problem, type ProblemPerson } from '$lib/domain/kit';
import { claimantOf, type SessionContent } from '$lib/domain/training';
import type { DefaultClaim } from '../schema';
import type { KitRegister } from '../../kit/in-service';
import type { Library } from '../../kit/library';
import { clustersOf, problemOf, type PlanSlot } from '../../kit/plan';
import { filled } from '../../slots/shortages';
import type { SlotLimits } from '../../slots/places';
import type { Chosen } from './choices';
import type { SeedSlot } from './timetable';

/** `shortWhenFull`: how much runs short were every class as full as is planned, all as written. */
type Cluster = { slots: PlanSlot[]; problem: Problem; shortWhenFull: number };

/** The kit of the classes to come, asked by the same rules as a booking; in memory, one question a booking. */
export class KitDesk {
	readonly #clusters = new Map<number, Cluster>();

	constructor(
		coming: readonly SeedSlot[],
		private readonly lib: Library,
		register: KitRegister,
		private readonly limits: ReadonlyMap<number, SlotLimits>,
		contents: ReadonlyMap<number, SessionContent>,
		defaultClaims: (slot: SeedSlot) => DefaultClaim[]
	) {
		const planned: PlanSlot[] = coming.map((slot) => ({
			id: slot.id,
			startsAt: slot.startsAt,
			endsAt: slot.endsAt,
			roomId: slot.roomId,
			content: slot.revisionId === null ? null : contents.get(slot.revisionId)!,
			defaultClaims: defaultClaims(slot),
			people: []
		}));
		for (const slots of clustersOf(planned)) {
			const problem = problemOf(slots, lib, register);
			const cluster = { slots, problem, shortWhenFull: this.#shortWhenFull(slots, problem) };
			for (const { id } of slots) this.#clusters.set(id, cluster);
		}
	}

	contentOf(slotId: number): SessionContent | null {
		return this.#clusters.get(slotId)!.slots.find(({ id }) => id === slotId)!.content;
	}

	/**
	 * Takes one more person in, as chosen or, where that is short, as offered; false where nothing
	 * they can do serves them, or the choice would leave a full class short that is not so already.
	 * The choices come back as they stand.
	 */
	serve(slotId: number, personId: number, choices: Chosen): Chosen | false {
		const cluster = this.#clusters.get(slotId)!;
		const slot = cluster.problem.slots.find(({ id }) => id === String(slotId))!;
		const person = this.#person(slotId, personId, choices);
		const answer = serveNewcomer(cluster.problem, slot.id, person);
		if (!answer.served && !answer.offer) return false;
		const taken = answer.served ? choices : this.#withOffer(slotId, choices, answer.offer!);
		slot.people.push(this.#person(slotId, personId, taken));
		if (taken === choices && Object.keys({ ...taken.variations, ...taken.loads }).length === 0)
			return taken;
		if (this.#shortWhenFull(cluster.slots, cluster.problem) <= cluster.shortWhenFull) return taken;
		slot.people.pop();
		return false;
	}

	#withOffer(slotId: number, { variations, loads }: Chosen, offer: Record<string, number>): Chosen {
		const offered: [string, number][] = [];
		for (const { id, movementId } of prescriptionsOf(this.contentOf(slotId))) {
			const rung = offer[id];
			if (rung !== undefined) offered.push([id, this.lib.movements[movementId]!.ladder[rung]!.id]);
		}
		return { variations: { ...variations, ...Object.fromEntries(offered) }, loads };
	}

	#shortWhenFull(slots: PlanSlot[], problem: Problem): number {
		return shortages(filled(problem, slots, this.limits)).length;
	}

	#person(slotId: number, personId: number, choices: Chosen): ProblemPerson {
		const id = String(personId);
		const content = this.contentOf(slotId);
		if (!content) return { id, variations: {}, loads: {} };
		return claimantOf(id, choices, content, this.lib.rules, this.lib.loadedGroups);
	}
}

const prescriptionsOf = (content: SessionContent | null) =>
	content?.blocks.flatMap((block) => block.prescriptions) ?? [];
