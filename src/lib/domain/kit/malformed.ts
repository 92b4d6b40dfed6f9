import type { Problem, ProblemBlock, ProblemPerson, ProblemSlot, Station } from './problem';

/**
 * Where a plan is not of the form of planning.md, section 2: an id twice (stations: in a
 * slot), a group twice in a variation, an empty block, an index off its ladder, a range
 * upside down, a number too small or not whole.
 */
export function malformed(problem: Problem): string[] {
	return [
		...twice(problem.kit.map(({ id }) => id)),
		...problem.kit
			.filter(({ inService, loadKg }) => !whole(inService, 0) || !(loadKg == null || loadKg >= 0))
			.map(({ id }) => id),
		...twice(problem.slots.map(({ id }) => id)),
		...problem.slots.flatMap(inSlot)
	];
}

function inSlot(slot: ProblemSlot): string[] {
	const stations = slot.blocks.flatMap((block) => block.stations);
	const byId = new Map(stations.map((station) => [station.id, station]));
	return [
		...(Number.isInteger(slot.startS) ? [] : [slot.id]),
		...twice(slot.blocks.map(({ id }) => id)).map((id) => `${slot.id}/${id}`),
		...twice(stations.map(({ id }) => id)).map((id) => `${slot.id}/${id}`),
		...twice(slot.people.map(({ id }) => id)).map((id) => `${slot.id}/${id}`),
		...twice(slot.typical.map(({ id }) => id)).map((id) => `${slot.id}/${id}`),
		...slot.blocks.flatMap((block) => inBlock(`${slot.id}/${block.id}`, block)),
		...[...slot.people, ...slot.typical].flatMap((person) =>
			inPerson(`${slot.id}/${person.id}`, person, byId)
		)
	];
}

function inBlock(where: string, block: ProblemBlock): string[] {
	const { startS, endS, waves = 1, stations } = block;
	const sound = whole(startS, 0) && whole(endS, startS + 1) && whole(waves, 1);
	return [
		...(sound && stations.length > 0 ? [] : [where]),
		...stations.flatMap((station) => inStation(`${where}/${station.id}`, station))
	];
}

function inStation(where: string, { ladder, asWritten }: Station): string[] {
	return [
		...(onLadder(asWritten, ladder.length) ? [] : [where]),
		...twice(ladder.map(({ id }) => id)).map((id) => `${where}/${id}`),
		...ladder
			.filter(
				({ needs }) =>
					twice(needs.map(({ group }) => group)).length > 0 ||
					needs.some((n) => !whole(n.quantity ?? 1, 1) || !whole(n.peoplePerPiece ?? 1, 1))
			)
			.map(({ id }) => `${where}/${id}`)
	];
}

function inPerson(where: string, person: ProblemPerson, stations: Map<string, Station>): string[] {
	const offLadder = Object.entries(person.variations ?? {}).filter(([id, index]) => {
		const station = stations.get(id);
		return station !== undefined && !onLadder(index, station.ladder.length);
	});
	const upsideDown = Object.entries(person.loads ?? {}).filter(([, groups]) =>
		Object.values(groups).some(([min, max]) => !(min >= 0 && max >= min && Number.isFinite(max)))
	);
	return [...offLadder, ...upsideDown].map(([id]) => `${where}/${id}`);
}

const whole = (number: number, least: number) => Number.isInteger(number) && number >= least;
const onLadder = (index: number, rungs: number) => whole(index, 0) && index < rungs;

function twice(ids: string[]): string[] {
	const seen = new Set<string>();
	return ids.filter((id) => seen.size === seen.add(id).size);
}
