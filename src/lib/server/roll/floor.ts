import { claimedWithin, slotClaims, type BlockClaim } from '$lib/domain/kit/claims';
import type { Block, Prescription, SessionContent } from '$lib/domain/training';
import { blockTitle } from '$lib/wording/blocks';
import type { Viewer } from '../guard';
import { kitRegister } from '../kit/in-service';
import { library, type Library } from '../kit/library';
import { problemOf } from '../kit/plan';
import { planSlotsBetween, revisionContents } from '../slots/plan-slots';
import { rollWithNotes, type RollPage } from './desk';

/** The kit of one block: what to put out for the people who are in, and the loads that they chose. */
export type PutOut = {
	item: string;
	count: number;
	loads: { kg: [number, number]; people: number }[];
};
export type FloorBlock = {
	id: string;
	title: string;
	startS: number;
	endS: number;
	effort: 1 | 2 | 3 | 4 | 5;
	plan: Block;
	putOut: PutOut[];
	steps: {
		id: string;
		movement: string;
		variation: string;
		prescription: Prescription;
		ladder: { id: number; name: string }[];
	}[];
};
export type FloorPage = RollPage & {
	aim: string;
	blocks: FloorBlock[];
	cautions: { movement: string; text: string }[];
};

/** A class as its coach needs it: who comes and how, what to do, what to put out, what to mind. */
export async function floorPage(
	viewer: Pick<Viewer, 'personId' | 'capabilities'>,
	slotId: number
): Promise<FloorPage | null> {
	const page = await rollWithNotes(viewer, slotId);
	if (!page) return null;
	const { slot } = page;
	const content =
		slot.revisionId === null
			? null
			: (await revisionContents([slot.revisionId])).get(slot.revisionId);
	if (!slot.session || !content) return { ...page, aim: '', blocks: [], cautions: [] };
	const lib = await library();
	const putOut = await putOutOf(slot.id, slot.startsAt, slot.endsAt, lib);
	const written = new Map(content.blocks.map((block) => [block.id, block]));
	const blocks = slot.session.blocks.map((block) => ({
		id: block.id,
		plan: written.get(block.id)!,
		title: blockTitle(block),
		startS: block.startS,
		endS: block.endS,
		effort: block.effort,
		putOut: putOut.get(block.id) ?? [],
		steps: stepsOf(content, block.id, lib)
	}));
	const used = new Map(
		content.blocks.flatMap(({ prescriptions }) =>
			prescriptions.flatMap(({ movementId }) => {
				const movement = lib.movements[movementId];
				return movement?.cautions ? [[movement.name, movement.cautions] as const] : [];
			})
		)
	);
	return {
		...page,
		aim: content.aim,
		blocks,
		cautions: [...used].map(([movement, text]) => ({ movement, text }))
	};
}

function stepsOf(content: SessionContent, blockId: string, lib: Library): FloorBlock['steps'] {
	const prescriptions = content.blocks.find(({ id }) => id === blockId)?.prescriptions ?? [];
	return prescriptions.flatMap((prescription) => {
		const movement = lib.movements[prescription.movementId];
		const variation = movement?.ladder.find(({ id }) => id === prescription.variationId);
		if (!movement || !variation) return [];
		return {
			id: prescription.id,
			movement: movement.name,
			variation: variation.name,
			prescription,
			ladder: movement.ladder.map(({ id, name }) => ({ id, name }))
		};
	});
}

/** What the people who are in claim, by block: the same claims that decide the places. */
async function putOutOf(
	slotId: number,
	startsAt: number,
	endsAt: number,
	lib: Library
): Promise<Map<string, PutOut[]>> {
	const [around, register] = await Promise.all([
		planSlotsBetween(startsAt, endsAt),
		kitRegister(startsAt, endsAt)
	]);
	const problem = problemOf(around, lib, register);
	const own = problem.slots.find(({ id }) => id === String(slotId));
	const byBlock = new Map<string, PutOut[]>();
	for (const claim of own ? slotClaims(own, own.people) : []) {
		const count = claimedWithin(claim, -Infinity, Infinity);
		if (count === 0) continue;
		const blockId = claim.label.slice(claim.label.indexOf('/') + 1);
		const group = lib.groups[claim.group];
		const item = (count === 1 ? group?.name : group?.plural) ?? '';
		byBlock.set(blockId, [...(byBlock.get(blockId) ?? []), { item, count, loads: loadsOf(claim) }]);
	}
	return byBlock;
}

/** The loads that people chose of a claimed group, the lightest first. */
function loadsOf({ parts }: BlockClaim): PutOut['loads'] {
	const loads = new Map<string, PutOut['loads'][number]>();
	for (const { ranges, count } of parts.flatMap(({ claimants }) => [...claimants.values()])) {
		for (const { lo, hi } of ranges) {
			if (lo === -Infinity) continue;
			const load = loads.get(`${lo}-${hi}`) ?? { kg: [lo, hi], people: 0 };
			load.people += count;
			loads.set(`${lo}-${hi}`, load);
		}
	}
	return [...loads.values()].sort((a, b) => a.kg[0] - b.kg[0] || a.kg[1] - b.kg[1]);
}
