import {
	rungOf,
	type Problem,
	type ProblemBlock,
	type ProblemPerson,
	type ProblemSlot
} from './problem';

/** A load range and how many pieces of it; without bounds where any load will do. */
export type RangeClaim = { lo: number; hi: number; quantity: number };

/** What one person claims of a group in one part of a block, and how many people claim just so. */
type Claimants = { ranges: RangeClaim[]; count: number };

/** People among whom the `take` largest claims count: a whole block, or one station of a split one. */
type Part = { take: number; claimants: Map<string, Claimants> };

/** What a block claims of one group, from its start until just before its end, on the common clock. */
export type BlockClaim = {
	label: string;
	slotId: string;
	group: string;
	room: string;
	from: number;
	to: number;
	peoplePerPiece: number;
	parts: Part[];
};

/** One person's claims in one part of a block, by group. */
type Personal = Map<string, RangeClaim[]>;

/** Every claim of every slot, by group. */
export function claimsByGroup(problem: Problem): Map<string, BlockClaim[]> {
	const byGroup = new Map<string, BlockClaim[]>();
	for (const slot of problem.slots) {
		for (const claim of slotClaims(slot, slot.people)) {
			const known = byGroup.get(claim.group);
			if (known) known.push(claim);
			else byGroup.set(claim.group, [claim]);
		}
	}
	return byGroup;
}

/** What `people` claim in a slot, a row for each block and group. */
export function slotClaims(slot: ProblemSlot, people: readonly ProblemPerson[]): BlockClaim[] {
	return slot.blocks.flatMap((block) => blockClaims(slot, block, people));
}

function blockClaims(
	slot: ProblemSlot,
	block: ProblemBlock,
	people: readonly ProblemPerson[]
): BlockClaim[] {
	const claims = new Map<string, BlockClaim>();
	const partCount = block.rotation === 'split' ? block.stations.length : 1;
	const atATime = Math.ceil(people.length / (block.waves ?? 1));
	const take = Math.ceil(atATime / partCount);
	const sharing = sharingOf(block);
	for (const { person, count } of likeMinded(block, people)) {
		personalClaims(block, person).forEach((groups, part) => {
			for (const [group, ranges] of groups) {
				let claim = claims.get(group);
				if (!claim) {
					claim = {
						label: `${slot.id}/${block.id}`,
						slotId: slot.id,
						group,
						room: slot.room,
						from: slot.startS + block.startS,
						to: slot.startS + block.endS,
						peoplePerPiece: sharing.get(group) ?? 1,
						parts: Array.from({ length: partCount }, () => ({ take, claimants: new Map() }))
					};
					claims.set(group, claim);
				}
				addClaimants(claim.parts[part]!, ranges, count);
			}
		});
	}
	return [...claims.values()];
}

/** People who want the same in a block, counted: most of a class do, and are worked out once. */
function likeMinded(block: ProblemBlock, people: readonly ProblemPerson[]) {
	const minds = new Map<string, { person: ProblemPerson; count: number }>();
	for (const person of people) {
		let mind = '';
		for (const station of block.stations) {
			const rung = rungOf(station, person);
			mind += `${rung};`;
			const loads = person.loads?.[station.id];
			if (!loads) continue;
			for (const { group } of station.ladder[rung]?.needs ?? []) {
				const range = loads[group];
				mind += range ? `${range[0]}-${range[1]};` : '-;';
			}
		}
		const same = minds.get(mind);
		if (same) same.count += 1;
		else minds.set(mind, { person, count: 1 });
	}
	return minds.values();
}

function addClaimants(part: Part, ranges: RangeClaim[], count: number): void {
	let key = '';
	for (const { lo, hi, quantity } of ranges) key += `${lo}:${hi}:${quantity};`;
	const same = part.claimants.get(key);
	if (same) same.count += count;
	else part.claimants.set(key, { ranges, count });
}

/** People who share a piece, by group: one value in a block, or the plan is refused. */
function sharingOf(block: ProblemBlock): Map<string, number> {
	const sharing = new Map<string, number>();
	for (const station of block.stations) {
		for (const variation of station.ladder) {
			for (const need of variation.needs) sharing.set(need.group, need.peoplePerPiece ?? 1);
		}
	}
	return sharing;
}

/** Together: one map for the block, a group and range claimed once at its largest. Split: one a station. */
export function personalClaims(block: ProblemBlock, person: ProblemPerson): Personal[] {
	const together: Personal = new Map();
	const parts = block.stations.map((station) => {
		const personal: Personal = block.rotation === 'split' ? new Map() : together;
		const rung = rungOf(station, person);
		for (const need of station.ladder[rung]?.needs ?? []) {
			const range = person.loads?.[station.id]?.[need.group];
			claimOnce(personal, need.group, {
				lo: range ? range[0] : -Infinity,
				hi: range ? range[1] : Infinity,
				quantity: need.quantity ?? 1
			});
		}
		return personal;
	});
	return block.rotation === 'split' ? parts : [together];
}

function claimOnce(personal: Personal, group: string, claim: RangeClaim): void {
	const ranges = personal.get(group);
	if (!ranges) {
		personal.set(group, [claim]);
		return;
	}
	const same = ranges.find((r) => r.lo === claim.lo && r.hi === claim.hi);
	if (same) same.quantity = Math.max(same.quantity, claim.quantity);
	else {
		ranges.push(claim);
		ranges.sort((a, b) => a.lo - b.lo || a.hi - b.hi);
	}
}

/** Pieces that a block claims of those from `a` to `b` kilograms; of all with infinite bounds. */
export function claimedWithin(claim: BlockClaim, a: number, b: number): number {
	let pieces = 0;
	for (const part of claim.parts) pieces += Math.ceil(largest(part, a, b) / claim.peoplePerPiece);
	return pieces;
}

/** Sum of the `take` largest personal claims whose ranges lie in [a, b]. */
function largest({ take, claimants }: Part, a: number, b: number): number {
	let people = 0;
	let all = 0;
	const sizes: [number, number][] = [];
	for (const { ranges, count } of claimants.values()) {
		let size = 0;
		for (const { lo, hi, quantity } of ranges) if (lo >= a && hi <= b) size += quantity;
		if (size === 0) continue;
		sizes.push([size, count]);
		people += count;
		all += size * count;
	}
	if (people <= take) return all;
	sizes.sort((x, y) => y[0] - x[0]);
	let left = take;
	let sum = 0;
	for (const [size, count] of sizes) {
		const counted = Math.min(left, count);
		sum += size * counted;
		left -= counted;
		if (left === 0) break;
	}
	return sum;
}
