import { bookingWindow, coveringPass, cutOffAt } from '$lib/domain/booking';
import { weekOf } from '$lib/domain/calendar/civil-date';
import { packCredits } from './people-data';
import type { Hour, SeedMember, SeedPass } from './people';
import type { Random } from './random';
import { classTypeData } from './timetable-data';
import { zone, type SeedSlot } from './timetable';

/**
 * Who is where and what pays: nobody is in two classes at once or twice on a day, nor past what
 * their pass allows. A credit counts as spent even where it comes back, so that the ledger holds
 * in whatever order things happened.
 */
export class Diary {
	readonly #days = new Set<string>();
	readonly #weeks = new Map<string, number>();
	readonly #spent = new Map<number, number>();

	isFree(member: SeedMember, slot: SeedSlot): boolean {
		return !this.#days.has(`${member.id} ${slot.startsOn}`);
	}

	/** How many classes of the slot's week they hold already. */
	timesIn(member: SeedMember, slot: SeedSlot): number {
		return this.#weeks.get(`person ${member.id} ${weekOf(slot.startsOn)}`) ?? 0;
	}

	/** The pass that pays, by the rule that the desk goes by. */
	passFor(member: SeedMember, slot: SeedSlot): SeedPass | null {
		const week = weekOf(slot.startsOn);
		const held = member.passes.map((pass) => ({
			...pass,
			endedAt: null,
			balance: pass.kind === 'pack' ? packCredits - (this.#spent.get(pass.id) ?? 0) : 0,
			usedThisWeek: this.#weeks.get(`pass ${pass.id} ${week}`) ?? 0
		}));
		const id = coveringPass(held, slot.startsOn);
		return member.passes.find((pass) => pass.id === id) ?? null;
	}

	note(member: SeedMember, slot: SeedSlot, pass: SeedPass | null): void {
		const week = weekOf(slot.startsOn);
		this.#days.add(`${member.id} ${slot.startsOn}`);
		this.#raise(`person ${member.id} ${week}`);
		if (!pass) return;
		this.#raise(`pass ${pass.id} ${week}`);
		if (pass.kind === 'pack') this.#spent.set(pass.id, (this.#spent.get(pass.id) ?? 0) + 1);
	}

	/** Keeps a day free for a class that is entered later. */
	reserve(member: SeedMember, slot: SeedSlot): void {
		this.#days.add(`${member.id} ${slot.startsOn}`);
	}

	#raise(key: string): void {
		this.#weeks.set(key, (this.#weeks.get(key) ?? 0) + 1);
	}
}

export const classType = ({ type }: SeedSlot) => classTypeData.find(({ key }) => key === type)!;

/** The schema's own default. */
const opensDaysBefore = 28;

type Times = { opensAt: number; cutOffAt: number };
const known = new WeakMap<SeedSlot, Times>();

/** When the slot can be booked and until when it is cancelled in time. */
export function timesOf(slot: SeedSlot): Times {
	const times = known.get(slot) ?? workOutTimes(slot);
	known.set(slot, times);
	return times;
}

function workOutTimes(slot: SeedSlot): Times {
	const { startsAt, startsOn } = slot;
	const start = { startsAt, startsOn, zone };
	const { cutOffMin, cutOffClock } = classType(slot);
	const { opensAt } = bookingWindow({ ...start, opensDaysBefore, closesMinBefore: 0 });
	return { opensAt, cutOffAt: cutOffAt({ ...start, cutOffMin, cutOffClock }) };
}

export function hourOf({ startTime }: SeedSlot): Hour {
	if (startTime < '09:00') return 'early';
	if (startTime < '12:00') return 'morning';
	return startTime < '16:00' ? 'lunch' : 'evening';
}

/** Early mornings and evenings fill up; Friday and the lunch hour do not. */
export function popularity(slot: SeedSlot): number {
	const byHour = { early: 0.65, morning: 0.5, lunch: 0.42, evening: 0.78 }[hourOf(slot)];
	const saturday = slot.day === 5 ? 1.4 : 1;
	const friday = slot.day === 4 ? 0.85 : 1;
	return byHour * saturday * friday;
}

/** Everybody, the likeliest first: by their hour, and newer people in the basics; out of it, few at all. */
export function likeliest(
	members: readonly SeedMember[],
	slot: SeedSlot,
	random: Random,
	isFull = false
): SeedMember[] {
	const hour = hourOf(slot);
	const weightOf = ({ favourite, second, level, keen }: SeedMember) => {
		const byHour = hour === favourite ? 1 : hour === second ? 0.3 : 0.05;
		const byLevel = slot.type === 'basics' ? (level < 0.4 ? 2 : 0.3) : 1;
		return byHour * byLevel * (0.5 + keen / 4);
	};
	const mayCome = ({ favourite, second }: SeedMember) =>
		isFull ||
		slot.day === 5 ||
		hour === favourite ||
		random.next() < (hour === second ? 0.3 : 0.03);
	return members
		.filter(mayCome)
		.map((member) => ({ member, key: -Math.log(1 - random.next()) / weightOf(member) }))
		.sort((a, b) => a.key - b.key || a.member.id - b.member.id)
		.map(({ member }) => member);
}

/** Day after day, the classes of each in any order, so that the late ones are not left with nobody. */
export function inDayOrder(slots: readonly SeedSlot[], random: Random): SeedSlot[] {
	const keyed = slots.map((slot) => ({ slot, key: random.next() }));
	keyed.sort((a, b) =>
		a.slot.startsOn < b.slot.startsOn ? -1 : a.slot.startsOn > b.slot.startsOn ? 1 : a.key - b.key
	);
	return keyed.map(({ slot }) => slot);
}

export const isPack = (pass: SeedPass): boolean => pass.kind === 'pack';
