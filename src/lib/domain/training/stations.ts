import { refuse, type Refused } from '../refusal';
import { sessionPlan } from './plan';
import type { Block, Prescription, SessionContent } from './session';

export type Need = { group: string; quantity: number; peoplePerPiece: number };
/** A rung of a movement's ladder, as the library keeps it. Groups are named by `String(kitGroup.id)`. */
export type Rung = { id: number; needs: readonly Need[] };
/** Movements by id: seconds a rep without tempo, and the ladder, hardest first, archived rungs in use included. */
export type MovementLibrary = Readonly<
	Record<number, { secondsPerRep: number; ladder: readonly Rung[] } | undefined>
>;

/** A station and a block of the kit rules: ids are those of the prescription, the block and `String(variationId)`. */
export type Station = { id: string; ladder: { id: string; needs: Need[] }[]; asWritten: number };
export type StationBlock = {
	id: string;
	startS: number;
	endS: number;
	rotation: 'together' | 'split';
	waves: number;
	stations: Station[];
};

type Unknown = Refused<'unknown-movement' | 'unknown-variation'>;

/**
 * The blocks of a session as the kit rules take them, timed from the class's start. Blocks without
 * prescriptions claim nothing and are left out. Refused where the library lacks a movement or the
 * ladder a variation; `detail` has the prescription and the missing id.
 */
export function stationsOf(
	content: Pick<SessionContent, 'blocks'>,
	library: MovementLibrary
): { ok: true; blocks: StationBlock[] } | Unknown {
	const { blocks: spans } = sessionPlan(content, 0, secondsPerRep(library));
	const blocks: StationBlock[] = [];
	for (const [b, block] of content.blocks.entries()) {
		const stations = blockStations(block, library);
		if (!stations.ok) return stations;
		const { startS, endS } = spans[b]!;
		const { id, rotation, waves } = block;
		if (stations.all.length > 0)
			blocks.push({ id, startS, endS, rotation, waves, stations: stations.all });
	}
	return { ok: true, blocks };
}

/** Each movement's default seconds a rep, for `sessionPlan`. */
export const secondsPerRep = (library: MovementLibrary): Record<number, number | undefined> =>
	Object.fromEntries(
		Object.entries(library).map(([id, movement]) => [id, movement?.secondsPerRep])
	);

function blockStations(
	block: Block,
	library: MovementLibrary
): { ok: true; all: Station[] } | Unknown {
	const all: Station[] = [];
	for (const prescription of block.prescriptions) {
		const station = stationOf(prescription, library);
		if (!station.ok) return station;
		all.push(station.station);
	}
	return { ok: true, all };
}

function stationOf(
	{ id, movementId, variationId }: Prescription,
	library: MovementLibrary
): { ok: true; station: Station } | Unknown {
	const ladder = library[movementId]?.ladder;
	if (!ladder) return refuse('unknown-movement', { prescription: id, movementId });
	const asWritten = ladder.findIndex((rung) => rung.id === variationId);
	if (asWritten < 0) return refuse('unknown-variation', { prescription: id, variationId });
	const rungs = ladder.map((rung) => ({
		id: String(rung.id),
		needs: rung.needs.map((need) => ({ ...need }))
	}));
	return { ok: true, station: { id, ladder: rungs, asWritten } };
}
