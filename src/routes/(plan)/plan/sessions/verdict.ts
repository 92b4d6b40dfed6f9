import type { Lane } from '$lib/components/kit/lanes';
import { places, type Places, type Problem } from '$lib/domain/kit';
import { claimedWithin, slotClaims } from '$lib/domain/kit/claims';
import { firstPeople } from '$lib/domain/kit/places';
import {
	claimantOf,
	secondsPerRep,
	sessionPlan,
	stationsOf,
	type MovementLibrary,
	type SessionContent,
	type SessionPlan
} from '$lib/domain/training';
import type { Workshop } from '$lib/server/sessions/queries';

export type Verdict = {
	plan: SessionPlan | null;
	/** Null while the draft cannot be counted. */
	kit: (Places & { lanes: Lane[] }) | null;
};

export type Trial = { people: number; roomId: number; lengthMin: number };

export const rulesOf = (workshop: Workshop): MovementLibrary =>
	Object.fromEntries(workshop.movements.map((movement) => [movement.id, movement]));

/** Does it fit the hour, and whom does the kit serve: worked out as it is typed, by the server's own rules. */
export function verdictOf(
	content: SessionContent,
	workshop: Workshop,
	rules: MovementLibrary,
	{ people, roomId, lengthMin }: Trial
): Verdict {
	const plan = planned(content, lengthMin, rules);
	const stations = plan && stationsOf(content, rules);
	if (!stations?.ok) return { plan, kit: null };
	const loaded = new Set(workshop.loadedGroups);
	const problem: Problem = {
		kit: workshop.kit,
		slots: [
			{
				id: 'draft',
				startS: 0,
				room: String(roomId),
				blocks: stations.blocks.filter(({ startS, endS }) => endS > startS),
				people: [],
				typical: [claimantOf('as written', {}, content, rules, loaded)]
			}
		]
	};
	const answer = places(problem, {
		slotId: 'draft',
		limits: { room: people, ratio: null, coaches: null, set: null }
	});
	return { plan, kit: { ...answer, lanes: lanesOf(problem, people, workshop) } };
}

function planned(content: SessionContent, lengthMin: number, rules: MovementLibrary) {
	try {
		const plan = sessionPlan(content, lengthMin * 60, secondsPerRep(rules));
		return plan.blocks.every(({ endS }) => Number.isFinite(endS)) ? plan : null;
	} catch {
		return null;
	}
}

/** What so many people as written claim, a lane for each kind of kit, the scarcest first. */
function lanesOf(problem: Problem, people: number, { groups }: Workshop): Lane[] {
	const slot = problem.slots[0]!;
	const lanes = new Map<string, Lane>();
	for (const claim of slotClaims(slot, firstPeople(slot, 0, people))) {
		const count = claimedWithin(claim, -Infinity, Infinity);
		if (count === 0) continue;
		const lane = lanes.get(claim.group) ?? {
			id: claim.group,
			name: groups[claim.group]?.plural ?? claim.group,
			inService: problem.kit
				.filter(({ group, room }) => group === claim.group && (room == null || room === slot.room))
				.reduce((sum, { inService }) => sum + inService, 0),
			claims: []
		};
		lane.claims.push({
			slotId: 'draft',
			label: lane.name,
			from: claim.from,
			to: claim.to,
			count,
			tone: 1
		});
		lanes.set(claim.group, lane);
	}
	const tightness = ({ claims, inService }: Lane) =>
		Math.max(...claims.map(({ count }) => count / Math.max(inService, 0.5)));
	return [...lanes.values()].sort((a, b) => tightness(b) - tightness(a));
}
