import {
	places,
	shortages,
	type Problem,
	type ProblemPerson,
	type Shortage
} from '$lib/domain/kit';
import { db, type Queryable } from '../db';
import { kitRegister } from '../kit/in-service';
import { library } from '../kit/library';
import { clustersOf, problemOf, type PlanSlot } from '../kit/plan';
import { limitsOfSlots } from './limits';
import { limitsOf, type SlotLimits } from './places';
import { planSlotsBetween } from './plan-slots';

/** Kit that falls short in the time ahead. Instants are epoch ms. */
export type ShortageAhead = {
	kitGroupId: number;
	/** "rowers"; `interval` names the loads, kg, where only some run out. */
	item: string;
	interval: [number, number] | null;
	/** Null: the site's. */
	roomId: number | null;
	fromAt: number;
	toAt: number;
	claimed: number;
	inService: number;
	short: number;
	/** Short for people who hold a place already, not just at the places planned. */
	isForBooked: boolean;
	blocks: {
		slotId: number;
		/** The block's id in its session; `class` where default claims count. */
		blockId: string;
		/** How many people the kit serves in that slot beside the others as planned. */
		kitTakes: number;
		/** What it is planned for. */
		planned: number;
	}[];
};

/** What a session-less slot without a limit is planned for: nobody plans a crowd. */
const plannedAtMost = 100;

/**
 * Everything that runs short from `fromAt` until just before `toAt`: with every slot at its planned
 * places, and with the people who are in. One pass over the range; only slots that meet in time
 * are counted together.
 */
export async function shortagesAhead(
	{ fromAt, toAt }: { fromAt: number; toAt: number },
	q: Queryable = db
): Promise<ShortageAhead[]> {
	const standing = await planSlotsBetween(fromAt, toAt, q);
	const [lib, register, limits] = await Promise.all([
		library(q),
		kitRegister(fromAt, toAt, q),
		limitsOfSlots(
			standing.map(({ id }) => id),
			q
		)
	]);
	return clustersOf(standing).flatMap((cluster) => {
		const clockAt = cluster[0]!.startsAt;
		const booked = problemOf(cluster, lib, register);
		const planned = filled(booked, cluster, limits);
		const short = { booked: shortages(booked), planned: shortages(planned) };
		const all = [
			...short.planned,
			...short.booked.filter((b) => !short.planned.some((p) => meet(p, b)))
		];
		return all.map((shortage) => ({
			...onClock(shortage, clockAt),
			item: lib.groups[shortage.group]?.plural ?? shortage.group,
			isForBooked: short.booked.some((b) => meet(b, shortage)),
			blocks: shortage.blocks.map((named) => guilty(named, planned, limits))
		}));
	});
}

/** The same slots, each with people as written up to the places that room, coaches and hand allow. */
export function filled(
	problem: Problem,
	slots: readonly PlanSlot[],
	limits: ReadonlyMap<number, SlotLimits>
): Problem {
	return {
		...problem,
		slots: problem.slots.map((slot, i) => {
			const planned = plannedPlaces(limits.get(slots[i]!.id));
			const missing = Math.max(0, planned - slot.people.length);
			const more = Array.from({ length: missing }, (_, n): ProblemPerson => {
				const next = slot.typical[n % Math.max(1, slot.typical.length)];
				return { ...next, id: `${slot.id}+${n}` };
			});
			return { ...slot, people: [...slot.people, ...more] };
		})
	};
}

/** The least of room, coaches and a number set by hand. */
export function plannedPlaces(limits: SlotLimits | undefined): number {
	if (!limits) return 0;
	const { room, ratio, coaches, set } = limitsOf(limits);
	const byCoach = ratio !== null && coaches !== null ? ratio * coaches : plannedAtMost;
	return Math.max(0, Math.min(plannedAtMost, room, byCoach, set ?? plannedAtMost));
}

const meet = (a: Shortage, b: Shortage) =>
	a.group === b.group && a.room === b.room && a.from < b.to && b.from < a.to;

const onClock = (shortage: Shortage, clockAt: number) => ({
	kitGroupId: Number(shortage.group),
	interval: shortage.interval,
	roomId: shortage.room === null ? null : Number(shortage.room),
	fromAt: clockAt + shortage.from * 1000,
	toAt: clockAt + shortage.to * 1000,
	claimed: shortage.claimed,
	inService: shortage.inService,
	short: shortage.short
});

function guilty(
	named: string,
	planned: Problem,
	limits: ReadonlyMap<number, SlotLimits>
): ShortageAhead['blocks'][number] {
	const [slotId = '', blockId = ''] = named.split('/');
	const of = limits.get(Number(slotId));
	const { asWritten } = places(planned, { slotId, limits: limitsOf(of!) });
	return { slotId: Number(slotId), blockId, kitTakes: asWritten, planned: plannedPlaces(of) };
}
