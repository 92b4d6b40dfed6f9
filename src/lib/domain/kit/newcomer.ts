import { Beside } from './beside';
import { slotClaims } from './claims';
import {
	rungOf,
	type Problem,
	type ProblemPerson,
	type ProblemSlot,
	type Station
} from './problem';
import { joined, openRungs } from './regressions';

/**
 * Whether the kit serves one more person: as chosen, or by the fewest stations moved and then
 * the fewest steps down that do (planning.md, section 4, Booking). Nobody booked is moved.
 * `offer` has the rung at each moved station; null where nothing the person can do serves them.
 */
export type NewcomerAnswer =
	{ served: true } | { served: false; offer: Record<string, number> | null };

/** @throws RangeError when the problem has no such slot */
export function serveNewcomer(
	problem: Problem,
	slotId: string,
	newcomer: ProblemPerson
): NewcomerAnswer {
	const slot = problem.slots.find(({ id }) => id === slotId);
	if (!slot) throw new RangeError(`no slot ${slotId}`);
	const beside = new Beside(problem, slot, slot.people);
	const fits = (part: ProblemSlot, person: ProblemPerson) =>
		!beside.isWorse(slotClaims(part, [...slot.people, person]));
	if (fits(slot, newcomer)) return { served: true };

	const offer: Record<string, number> = {};
	for (const blocks of joined(slot.blocks)) {
		const part = { ...slot, blocks };
		const stations = blocks.flatMap((block) => block.stations);
		const move = moves(stations, newcomer).find(({ variations }) =>
			fits(part, { ...newcomer, variations: { ...newcomer.variations, ...variations } })
		);
		if (!move) return { served: false, offer: null };
		Object.assign(offer, move.variations);
	}
	return { served: false, offer };
}

type Move = { variations: Record<string, number>; moved: number; steps: number };

/** Every way down for one person at these stations: fewest stations moved first, then fewest steps. */
function moves(stations: Station[], person: ProblemPerson): Move[] {
	let all: Move[] = [{ variations: {}, moved: 0, steps: 0 }];
	for (const station of stations) {
		const first = rungOf(station, person);
		all = all.flatMap((move) =>
			openRungs(station, person).map((rung) =>
				rung === first
					? move
					: {
							variations: { ...move.variations, [station.id]: rung },
							moved: move.moved + 1,
							steps: move.steps + rung - first
						}
			)
		);
	}
	return all.sort((x, y) => x.moved - y.moved || x.steps - y.steps);
}
