import { malformed } from './malformed';
import { rungOf, type KitItem, type Problem, type ProblemBlock, type ProblemSlot } from './problem';

/** Why a plan cannot be counted: planning.md, section 2, "Refused, with the reason". */
export type PlanRefusal = {
	code: 'loads' | 'housing' | 'unknown-group' | 'sharing' | 'no-variation' | 'malformed';
	/** Where, as group, "slot/block/station/variation" or "slot/person/station": for a reader, not a key. */
	where: string;
};

/**
 * Everything that keeps a plan from being counted, in the order of the codes above.
 * A malformed plan is refused as such alone: the other rules could not be asked of it.
 * @returns an empty list where the plan is accepted
 */
export function refusals(problem: Problem): PlanRefusal[] {
	const broken = malformed(problem).map((where) => ({ code: 'malformed' as const, where }));
	if (broken.length > 0) return broken;
	const groups = groupKit(problem.kit);
	return [
		...loads(groups),
		...housing(groups),
		...needs(problem, groups),
		...problem.slots.flatMap(noVariation)
	];
}

function groupKit(kit: KitItem[]): Map<string, KitItem[]> {
	const groups = new Map<string, KitItem[]>();
	for (const item of kit) groups.set(item.group, [...(groups.get(item.group) ?? []), item]);
	return groups;
}

const hasLoad = (item: KitItem) => item.loadKg != null;
const hasRoom = (item: KitItem) => item.room != null;

function loads(groups: Map<string, KitItem[]>): PlanRefusal[] {
	return [...groups]
		.filter(([, items]) => items.some(hasLoad) && !items.every(hasLoad))
		.map(([where]) => ({ code: 'loads', where }));
}

function housing(groups: Map<string, KitItem[]>): PlanRefusal[] {
	return [...groups]
		.filter(([, items]) => items.some(hasLoad) && items.some(hasRoom) && !items.every(hasRoom))
		.map(([where]) => ({ code: 'housing', where }));
}

function needs(problem: Problem, groups: Map<string, KitItem[]>): PlanRefusal[] {
	const unknown: PlanRefusal[] = [];
	const sharing: PlanRefusal[] = [];
	for (const slot of problem.slots) {
		for (const block of slot.blocks) {
			for (const station of block.stations) {
				for (const variation of station.ladder) {
					const where = `${slot.id}/${block.id}/${station.id}/${variation.id}`;
					for (const { group, quantity = 1, peoplePerPiece = 1 } of variation.needs) {
						const items = groups.get(group);
						if (!items) unknown.push({ code: 'unknown-group', where });
						if (peoplePerPiece > 1 && (quantity > 1 || items?.some(hasLoad))) {
							sharing.push({ code: 'sharing', where });
						}
					}
				}
			}
			sharing.push(...twoValues(slot, block));
		}
	}
	return [...unknown, ...sharing];
}

/** Two numbers of people a piece for one group in one block. */
function twoValues(slot: ProblemSlot, block: ProblemBlock): PlanRefusal[] {
	const values = new Map<string, Set<number>>();
	for (const station of block.stations) {
		for (const variation of station.ladder) {
			for (const { group, peoplePerPiece = 1 } of variation.needs) {
				values.set(group, (values.get(group) ?? new Set()).add(peoplePerPiece));
			}
		}
	}
	return [...values]
		.filter(([, shared]) => shared.size > 1)
		.map(([group]) => ({ code: 'sharing', where: `${slot.id}/${block.id}/${group}` }));
}

function noVariation(slot: ProblemSlot): PlanRefusal[] {
	const stations = slot.blocks.flatMap((block) => block.stations);
	return [...slot.people, ...slot.typical].flatMap((person) =>
		stations
			.filter((station) => rungOf(station, person) === -1)
			.map((station) => ({
				code: 'no-variation' as const,
				where: `${slot.id}/${person.id}/${station.id}`
			}))
	);
}
