import type { Prescription, SessionContent } from '$lib/domain/training';
import type { Library } from '../../kit/library';
import { demoItems, type GroupKey } from './kit-data';
import type { SeedMember } from './people';
import type { Random } from './random';

export type Chosen = {
	variations: Record<string, number>;
	loads: Record<string, [number, number]>;
};

/** Nobody chooses how to warm up. */
const chosenIn = new Set(['opener', 'skill', 'strength', 'circuit', 'conditioning']);

/** What a member would choose of a session: newer people take a regression, most name a load. */
export function chooseFor(
	member: SeedMember,
	content: SessionContent,
	lib: Library,
	groupIds: Record<GroupKey, number>,
	random: Random
): Chosen {
	const variations: Record<string, number> = {};
	const loads: Record<string, [number, number]> = {};
	const prescriptions = content.blocks
		.filter(({ kind }) => chosenIn.has(kind))
		.flatMap((block) => block.prescriptions);
	for (const prescription of prescriptions) {
		const { ladder } = lib.movements[prescription.movementId]!;
		const written = ladder.findIndex(({ id }) => id === prescription.variationId);
		const rung = rungFor(member, written, ladder.length, random);
		if (rung !== written) variations[prescription.id] = ladder[rung]!.id;
		const groups = ladder[rung]!.needs.map(({ group }) => group);
		const range = loadFor(member, prescription, groups, groupIds, random);
		if (range) loads[prescription.id] = range;
	}
	return { variations, loads };
}

function rungFor({ level }: SeedMember, written: number, rungs: number, random: Random): number {
	const share = random.next();
	if (level > 0.9 && written > 0 && share < 0.15) return written - 1;
	if (level > 0.45 || share > 0.45 - level) return written;
	const steps = level < 0.12 && share < 0.1 ? 2 : 1;
	return Math.min(rungs - 1, written + steps);
}

/** One load of the range that is written, or two next to each other: heavier for the stronger. */
function loadFor(
	{ level }: SeedMember,
	{ load }: Prescription,
	groups: string[],
	groupIds: Record<GroupKey, number>,
	random: Random
): [number, number] | null {
	if (load.kind !== 'kg' || random.next() > 0.6) return null;
	const own = demoItems.filter(
		({ group, kg }) =>
			kg !== undefined &&
			groups.includes(String(groupIds[group])) &&
			kg >= load.minKg &&
			kg <= load.maxKg
	);
	if (own.length === 0) return null;
	const wanted = Math.floor(level * own.length * (0.6 + 0.4 * random.next()));
	const at = Math.min(own.length - 1, wanted);
	const up = random.next() < 0.4 ? Math.min(own.length - 1, at + 1) : at;
	return [own[at]!.kg!, own[up]!.kg!];
}
