/**
 * The kit problem of planning.md, section 2: what there is, what runs, who is in it.
 * Times are whole seconds on one clock; loads are kilograms.
 */
export type Problem = { kit: KitItem[]; slots: ProblemSlot[] };

/** Real pieces of one load and one home. `room` left out: the site shares them. */
export type KitItem = {
	id: string;
	group: string;
	inService: number;
	loadKg?: number | null;
	room?: string | null;
};

export type ProblemSlot = {
	id: string;
	startS: number;
	room: string;
	blocks: ProblemBlock[];
	/** In booking order. */
	people: ProblemPerson[];
	/** Who comes next, in turn and repeated; empty means people as written. */
	typical: ProblemPerson[];
};

/** `startS` and `endS` count from the slot's start. */
export type ProblemBlock = {
	id: string;
	startS: number;
	endS: number;
	rotation: 'together' | 'split';
	waves?: number;
	stations: Station[];
};

/** `ladder` is hardest first; `asWritten` is an index of it. */
export type Station = { id: string; ladder: Variation[]; asWritten: number };
export type Variation = { id: string; needs: Need[] };
export type Need = { group: string; quantity?: number; peoplePerPiece?: number };

export type ProblemPerson = {
	id: string;
	/** Station id -> index of its ladder. */
	variations?: Record<string, number>;
	/** Station id -> group -> kilograms accepted, lowest and highest. */
	loads?: Record<string, Record<string, [number, number]>>;
	/** Variation ids that are ruled out. */
	cannot?: string[];
};

/** `room` null is the site, `interval` null the whole pool; `blocks` are "slot/block". */
export type Shortage = {
	from: number;
	to: number;
	group: string;
	room: string | null;
	interval: [number, number] | null;
	claimed: number;
	inService: number;
	short: number;
	blocks: string[];
};

export const personAsWritten: ProblemPerson = { id: 'as written', variations: {}, loads: {} };

/**
 * The rung that a person does at a station: the choice, else as written; where it is
 * ruled out, the first below that is not. -1 when nothing from the choice down is left.
 */
export function rungOf(station: Station, person: ProblemPerson): number {
	const chosen = person.variations?.[station.id] ?? station.asWritten;
	if (!person.cannot?.length) return chosen;
	for (let rung = chosen; rung < station.ladder.length; rung += 1) {
		if (!person.cannot.includes(station.ladder[rung]!.id)) return rung;
	}
	return -1;
}
