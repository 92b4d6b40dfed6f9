/** What one class claims of a lane's kit for a while; `tone` 1 or 2 is its room's colour. */
export type LaneClaim = {
	slotId: string;
	label: string;
	from: number;
	to: number;
	count: number;
	tone: 1 | 2;
};

export type Lane = { id: string; name: string; inService: number; claims: LaneClaim[] };

/** A rectangle of a lane: seconds across, pieces up. */
export type LaneBar = { claim: LaneClaim; from: number; to: number; base: number; count: number };

/** Where the claims pass what is there: shown as hatch above the line, with words. */
export type LaneShort = { from: number; to: number; short: number };

/** Stacks the claims that run at once, bottom up in their order, cut at every edge. */
export function laneBars(claims: LaneClaim[]): LaneBar[] {
	return stretches(claims).flatMap(({ from, to, running }) => {
		let base = 0;
		return running.map((claim) => {
			const bar = { claim, from, to, base, count: claim.count };
			base += claim.count;
			return bar;
		});
	});
}

export function laneShorts({ claims, inService }: Lane): LaneShort[] {
	const shorts: LaneShort[] = [];
	for (const { from, to, running } of stretches(claims)) {
		const short = running.reduce((sum, { count }) => sum + count, 0) - inService;
		if (short <= 0) continue;
		const last = shorts.at(-1);
		if (last && last.to === from && last.short === short) last.to = to;
		else shorts.push({ from, to, short });
	}
	return shorts;
}

export const lanePeak = (claims: LaneClaim[]): number =>
	Math.max(
		0,
		...stretches(claims).map(({ running }) => running.reduce((sum, { count }) => sum + count, 0))
	);

/** Pieces that the height of a lane stands for: max(1.25 x capacity, peak x 1.04) (DESIGN.md, Kit lanes). */
export const laneScale = ({ claims, inService }: Lane): number =>
	Math.max(1.25 * inService, lanePeak(claims) * 1.04, 1);

function stretches(claims: LaneClaim[]) {
	const edges = [...new Set(claims.flatMap(({ from, to }) => [from, to]))].sort((a, b) => a - b);
	return edges.slice(0, -1).map((from, i) => ({
		from,
		to: edges[i + 1]!,
		running: claims.filter((claim) => claim.from <= from && claim.to > from && claim.count > 0)
	}));
}
