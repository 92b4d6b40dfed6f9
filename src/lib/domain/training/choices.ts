import { refuse, type Refused } from '../refusal';
import type { Prescription, SessionContent } from './session';
import type { MovementLibrary } from './stations';

/** What a booking asks for, by prescription id: a variation's id, and a load in kg or the lowest and highest. */
export type Choices = {
	variations?: Readonly<Record<string, number>>;
	loads?: Readonly<Record<string, number | readonly [number, number]>>;
};

/** A person of the kit rules. Ranges are kilograms, both ends included. */
export type Claimant = {
	id: string;
	variations: Record<string, number>;
	loads: Record<string, Record<string, [number, number]>>;
};

/**
 * A booking as the kit rules take it: where its choice lies on each ladder, and what range of load
 * it accepts of each group that has loads (`loadedGroups`). A load not chosen is the prescription's;
 * a prescription of any load states no range. Without choices this is the typical person of a slot.
 */
export function claimantOf(
	id: string,
	choices: Choices,
	content: Pick<SessionContent, 'blocks'>,
	library: MovementLibrary,
	loadedGroups: ReadonlySet<string>
): Claimant {
	const claimant: Claimant = { id, variations: {}, loads: {} };
	for (const prescription of prescriptionsOf(content)) {
		const ladder = library[prescription.movementId]?.ladder ?? [];
		const rung = ladder.findIndex((r) => r.id === choices.variations?.[prescription.id]);
		if (rung >= 0) claimant.variations[prescription.id] = rung;
		const range = rangeOf(choices.loads?.[prescription.id]) ?? writtenRange(prescription);
		const groups = ladder.flatMap((r) => r.needs.map((need) => need.group));
		const ranges = groups.filter((g) => loadedGroups.has(g)).map((g) => [g, range] as const);
		if (range && ranges.length > 0)
			claimant.loads[prescription.id] = Object.fromEntries(ranges) as Record<
				string,
				[number, number]
			>;
	}
	return claimant;
}

/** The range of load as written; null where any will do. */
export const writtenRange = ({ load }: Pick<Prescription, 'load'>): [number, number] | null =>
	load.kind === 'kg' ? [load.minKg, load.maxKg] : null;

const rangeOf = (load: number | readonly [number, number] | undefined): [number, number] | null =>
	load === undefined ? null : typeof load === 'number' ? [load, load] : [load[0], load[1]];

/** Refuses choices for a prescription or a variation that the session does not have, and ranges that are upside down. */
export function checkChoices(
	choices: Choices,
	content: Pick<SessionContent, 'blocks'>,
	library: MovementLibrary
): { ok: true } | Refused<'unknown-choice' | 'bad-load'> {
	const { kept, dropped } = keepChoices(choices, content, library);
	if (dropped[0] !== undefined) return refuse('unknown-choice', { prescription: dropped[0] });
	for (const [prescription, load] of Object.entries(kept.loads)) {
		const [min, max] = rangeOf(load)!;
		if (!(min > 0 && min <= max && max <= 500)) return refuse('bad-load', { prescription });
	}
	return { ok: true };
}

/**
 * The choices that still exist in another revision; `dropped` names the prescriptions whose choice
 * falls to as written, for those people to be told.
 */
export function keepChoices(
	choices: Choices,
	content: Pick<SessionContent, 'blocks'>,
	library: MovementLibrary
): { kept: Required<Choices>; dropped: string[] } {
	const written = new Map(prescriptionsOf(content).map((p) => [p.id, p]));
	const variations = Object.entries(choices.variations ?? {});
	const loads = Object.entries(choices.loads ?? {});
	const keepsVariation = ([id, variationId]: [string, number]) =>
		library[written.get(id)?.movementId ?? -1]?.ladder.some((r) => r.id === variationId) ?? false;
	const keepsLoad = ([id]: [string, unknown]) => written.has(id);
	const gone = [
		...variations.filter((choice) => !keepsVariation(choice)),
		...loads.filter((choice) => !keepsLoad(choice))
	];
	return {
		kept: {
			variations: Object.fromEntries(variations.filter(keepsVariation)),
			loads: Object.fromEntries(loads.filter(keepsLoad))
		},
		dropped: [...new Set(gone.map(([id]) => id))]
	};
}

const prescriptionsOf = (content: Pick<SessionContent, 'blocks'>): Prescription[] =>
	content.blocks.flatMap((block) => block.prescriptions);
