import { slotClaims, type BlockClaim } from './claims';
import type { ProblemBlock, ProblemPerson, ProblemSlot, Station } from './problem';
import { rungOf } from './problem';

type IsWorse = (claims: BlockClaim[]) => boolean;

/**
 * Whether the people after the first `booked` can be served by going down their ladders,
 * the booked staying as they chose. Exact: blocks that no time joins are asked one by one,
 * and within a block every choice that could be the best is tried.
 */
export function canMove(
	slot: ProblemSlot,
	people: ProblemPerson[],
	booked: number,
	isWorse: IsWorse
): boolean {
	return joined(slot.blocks).every((blocks) => {
		const part: ProblemSlot = { ...slot, blocks };
		if (!isWorse(slotClaims(part, people))) return true;
		const units = blocks.flatMap(unitsOf);
		return search(part, people, booked, units, isWorse);
	});
}

/** Blocks in sets that run at a common time; sets do not meet. */
export function joined(blocks: ProblemBlock[]): ProblemBlock[][] {
	const sets: { blocks: ProblemBlock[]; end: number }[] = [];
	for (const block of [...blocks].sort((x, y) => x.startS - y.startS)) {
		const last = sets.at(-1);
		if (last && block.startS < last.end) {
			last.blocks.push(block);
			last.end = Math.max(last.end, block.endS);
		} else sets.push({ blocks: [block], end: block.endS });
	}
	return sets.map((set) => set.blocks);
}

/** Stations whose choices bear on one another: all of a block done together, each one of a split block. */
type Unit = { stations: Station[] };

const unitsOf = (block: ProblemBlock): Unit[] =>
	block.rotation === 'split'
		? block.stations.map((station) => ({ stations: [station] }))
		: [{ stations: block.stations }];

/** A choice of rungs at the stations of a unit. */
type Choice = Record<string, number>;

/** People with the same choices open to them in a unit, and those choices. */
type Kind = { members: number[]; choices: Choice[] };

/**
 * Tries each kind's people on each of its choices by count, not by name; a branch ends
 * where the people set so far, alone, already fall short, as more people never claim less.
 */
function search(
	slot: ProblemSlot,
	people: ProblemPerson[],
	booked: number,
	units: Unit[],
	isWorse: IsWorse
): boolean {
	const steps = units.flatMap((unit) => kindsOf(slot, people, booked, unit));
	const chosen = people.map((person) => ({ ...person, variations: { ...person.variations } }));
	const lightest = people.map((person) => ({ ...person, variations: { ...person.variations } }));
	for (const { members, choices } of steps) {
		for (const i of members) Object.assign(lightest[i]!.variations, choices[0]);
	}
	const onlyOne = steps.every(({ choices }) => choices.length === 1);
	if (onlyOne) return !isWorse(slotClaims(slot, lightest));
	return tryStep(0);

	function tryStep(step: number): boolean {
		if (step === steps.length) return !isWorse(slotClaims(slot, chosen));
		return tryChoice(step, 0, 0);
	}

	/** Gives the step's people from `from` on the choices from `choice` on. */
	function tryChoice(step: number, choice: number, from: number): boolean {
		const { members, choices } = steps[step]!;
		if (from === members.length) return partFits(step) && tryStep(step + 1);
		if (choice === choices.length) return false;
		const last = choice === choices.length - 1;
		const least = last ? members.length - from : 0;
		for (let count = members.length - from; count >= least; count -= 1) {
			for (let k = 0; k < count; k += 1) {
				Object.assign(chosen[members[from + k]!]!.variations, choices[choice]);
			}
			if (tryChoice(step, choice + 1, from + count)) return true;
			if (count === members.length - from && from + count === members.length && last) break;
		}
		return false;
	}

	/** Whether the steps up to this one, with the rest of the slot's stations left out, hold. */
	function partFits(step: number): boolean {
		if (step === steps.length - 1) return true;
		const set = new Set(
			steps.slice(0, step + 1).flatMap(({ choices }) => Object.keys(choices[0]!))
		);
		const trimmed: ProblemSlot = {
			...slot,
			blocks: slot.blocks.map((block) => ({
				...block,
				stations: block.stations.map((s) => (set.has(s.id) ? s : withoutKit(s)))
			}))
		};
		return !isWorse(slotClaims(trimmed, chosen));
	}
}

const withoutKit = (station: Station): Station => ({
	...station,
	ladder: station.ladder.map(({ id }) => ({ id, needs: [] }))
});

/** Groups the movable people by what they may do in a unit, and keeps the choices worth trying. */
function kindsOf(slot: ProblemSlot, people: ProblemPerson[], booked: number, unit: Unit): Kind[] {
	const kinds = new Map<string, Kind>();
	people.forEach((person, i) => {
		if (i < booked) return;
		const rungs = unit.stations.map((station) => openRungs(station, person));
		const key = JSON.stringify([rungs, unit.stations.map(({ id }) => person.loads?.[id] ?? null)]);
		const kind = kinds.get(key);
		if (kind) kind.members.push(i);
		else kinds.set(key, { members: [i], choices: worthTrying(slot, person, unit, rungs) });
	});
	return [...kinds.values()];
}

/** From the choice down, without what is ruled out. */
export function openRungs(station: Station, person: ProblemPerson): number[] {
	const first = rungOf(station, person);
	if (first === -1) return [];
	return station.ladder
		.map((_, rung) => rung)
		.filter((rung) => rung >= first && !person.cannot?.includes(station.ladder[rung]!.id));
}

/** The choices of a unit that no other undercuts in every group and load, least kit first. */
function worthTrying(
	slot: ProblemSlot,
	person: ProblemPerson,
	unit: Unit,
	rungs: number[][]
): Choice[] {
	const block = slot.blocks.find(({ stations }) => stations.includes(unit.stations[0]!))!;
	const all = product(rungs).map((combination) => {
		const choice = Object.fromEntries(unit.stations.map(({ id }, s) => [id, combination[s]!]));
		return { choice, wants: wantsOf(block, unit, person, choice) };
	});
	const kept: typeof all = [];
	for (const candidate of all.sort((x, y) => total(x.wants) - total(y.wants))) {
		if (!kept.some(({ wants }) => undercuts(wants, candidate.wants))) kept.push(candidate);
	}
	return kept.map(({ choice }) => choice);
}

/** Pieces wanted, by group and load range: the largest at any station, as they are claimed once. */
function wantsOf(block: ProblemBlock, unit: Unit, person: ProblemPerson, choice: Choice) {
	const wants = new Map<string, number>();
	for (const station of unit.stations) {
		for (const { group, quantity = 1 } of station.ladder[choice[station.id]!]!.needs) {
			const key = `${group}|${person.loads?.[station.id]?.[group] ?? ''}`;
			wants.set(key, Math.max(wants.get(key) ?? 0, quantity));
		}
	}
	return wants;
}

const total = (wants: Map<string, number>) => [...wants.values()].reduce((sum, n) => sum + n, 0);

const undercuts = (less: Map<string, number>, more: Map<string, number>) =>
	[...less].every(([key, quantity]) => (more.get(key) ?? 0) >= quantity);

function product(lists: number[][]): number[][] {
	return lists.reduce<number[][]>(
		(rows, list) => rows.flatMap((row) => list.map((item) => [...row, item])),
		[[]]
	);
}
