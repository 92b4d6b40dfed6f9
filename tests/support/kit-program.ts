import loadHighs from 'highs';
import type { Problem, ProblemSlot } from '../../src/lib/domain/kit';
import { naiveRung } from './naive-kit';

const highs = await loadHighs();

/** Sums of named unknowns, and what must hold of them, in the solver's own notation. */
class Program {
	readonly #rows: string[] = [];
	readonly #whole: string[] = [];
	readonly #free: string[] = [];
	#count = 0;

	unknown(kind: 'choice' | 'whole' | 'real'): string {
		const name = `x${(this.#count += 1)}`;
		if (kind === 'choice') this.#rows.push(` ${name} <= 1`);
		if (kind !== 'real') this.#whole.push(name);
		this.#free.push(name);
		return name;
	}

	row(terms: [number, string][], sign: '<=' | '>=' | '=', bound: number): void {
		const sums = new Map<string, number>();
		for (const [factor, name] of terms) sums.set(name, (sums.get(name) ?? 0) + factor);
		if (sums.size > 0) this.#rows.push(` ${sumOf(sums)} ${sign} ${bound}`);
	}

	/** The least of a sum, or null where the rows cannot hold. */
	least(terms: [number, string][]): number | null {
		const rows = this.#rows.map((row, i) => ` r${i}:${row}`);
		const text = [
			'Minimize',
			` obj: ${sumOf(new Map(terms.map(([factor, name]) => [name, factor]))) || '0 x1'}`,
			'Subject To',
			...rows,
			'General',
			` ${this.#whole.join(' ')}`,
			'End'
		].join('\n');
		let solved = highs.solve(text, { mip_rel_gap: 0 });
		/* At 1.15.3 presolve has called programs that can hold infeasible (our shared notes). */
		if (solved.Status !== 'Optimal')
			solved = highs.solve(text, { presolve: 'off', mip_rel_gap: 0 });
		return solved.Status === 'Optimal' ? Math.round(solved.ObjectiveValue) : null;
	}
}

const sumOf = (sums: Map<string, number>) =>
	[...sums]
		.map(([name, factor]) => `${factor < 0 ? '-' : '+'} ${Math.abs(factor)} ${name}`)
		.join(' ');

/**
 * Planning.md, section 3, as an integer program over every person, station and rung: the least
 * of 1000 for each pair moved and 1 for each step, or null where nothing serves everyone.
 * The largest `c` of some claims sum to the least of `c t + sum(max(0, claim - t))`.
 */
export function leastCost(problem: Problem): number | null {
	const program = new Program();
	const cost: [number, string][] = [];
	const wanted = problem.slots.map((slot) => ({ slot, blocks: wishesOf(slot) }));
	const times = new Set(
		problem.slots.flatMap((s) => s.blocks.map(({ startS }) => s.startS + startS))
	);
	for (const group of new Set(problem.kit.map((item) => item.group))) {
		const items = problem.kit.filter((item) => item.group === group);
		const isHoused = items.every(({ room }) => room != null);
		const rooms = [...new Set(problem.slots.map(({ room }) => room))];
		for (const pool of isHoused ? rooms : [null]) {
			for (const t of times) for (const range of rangesOf(group)) hold(group, pool, t, range);
		}
	}
	return program.least(cost);

	/** Unknowns for every rung open to every person, and what each comes to claim by range. */
	function wishesOf(slot: ProblemSlot) {
		return slot.blocks.map((block) => {
			const stations = block.stations.map((station) =>
				slot.people.map((person) => {
					const first = naiveRung(station, person);
					const rungs = station.ladder.flatMap(({ id, needs }, rung) =>
						rung < first || person.cannot?.includes(id)
							? []
							: [{ rung, needs, name: program.unknown('choice') }]
					);
					program.row(
						rungs.map(({ name }) => [1, name]),
						'=',
						1
					);
					for (const { rung, name } of rungs) {
						if (rung > first) cost.push([1000 + rung - first, name]);
					}
					return { rungs, loads: person.loads?.[station.id] ?? {} };
				})
			);
			const c = Math.ceil(slot.people.length / (block.waves ?? 1));
			const parts = block.rotation === 'split' ? stations.map((s) => [s]) : [stations];
			return { block, parts, take: Math.ceil(c / parts.length) };
		});
	}

	function rangesOf(group: string): [number, number][] {
		const stated = problem.slots.flatMap(({ people }) =>
			people.flatMap(({ loads }) =>
				Object.values(loads ?? {}).flatMap((of) => (of[group] ? [of[group]] : []))
			)
		);
		const hasLoads = problem.kit.some((item) => item.group === group && item.loadKg != null);
		const inner = hasLoads ? stated.flatMap(([a]) => stated.map(([, b]) => [a, b])) : [];
		const unique = new Map(inner.map((range) => [range.join(), range as [number, number]]));
		return [[-Infinity, Infinity], ...[...unique.values()].filter(([a, b]) => a <= b)];
	}

	function hold(group: string, pool: string | null, t: number, [a, b]: [number, number]): void {
		const items = problem.kit.filter(
			(i) => i.group === group && (i.loadKg == null || (i.loadKg >= a && i.loadKg <= b))
		);
		const pieces = (room: string | null) =>
			items
				.filter((item) => (item.room ?? null) === room)
				.reduce((sum, { inService }) => sum + inService, 0);
		const beyond: [number, string][] = [];
		for (const room of new Set(problem.slots.map((slot) => slot.room))) {
			if (pool !== null && room !== pool) continue;
			const claims = wanted
				.filter(({ slot }) => slot.room === room)
				.flatMap(({ slot, blocks }) =>
					blocks
						.filter(({ block }) => slot.startS + block.startS <= t && t < slot.startS + block.endS)
						.flatMap((part) => piecesOf(part, group, [a, b]))
				);
			const past = program.unknown('real');
			program.row(
				[[1, past], ...claims.map((name): [number, string] => [-1, name])],
				'>=',
				pool === null ? -pieces(room) : 0
			);
			beyond.push([1, past]);
		}
		program.row(beyond, '<=', pool === null ? pieces(null) : pieces(pool));
	}

	/** An unknown for each part: whole pieces that its largest claims come to. */
	function piecesOf(
		{ block, parts, take }: ReturnType<typeof wishesOf>[number],
		group: string,
		[a, b]: [number, number]
	): string[] {
		const need = block.stations
			.flatMap(({ ladder }) => ladder.flatMap(({ needs }) => needs))
			.find((n) => n.group === group);
		if (!need) return [];
		return parts.map((stations) => {
			const threshold = program.unknown('real');
			const sum: [number, string][] = [[take, threshold]];
			for (let p = 0; p < stations[0]!.length; p += 1) {
				const over = program.unknown('real');
				sum.push([1, over]);
				const claim = new Map<string, string>();
				for (const station of stations) {
					const { rungs, loads } = station[p]!;
					const [lo, hi] = loads[group] ?? [-Infinity, Infinity];
					if (lo < a || hi > b) continue;
					const key = `${lo}:${hi}`;
					const quantity = claim.get(key) ?? program.unknown('real');
					claim.set(key, quantity);
					const asked = rungs.map(({ name, needs }): [number, string] => [
						-(needs.find((n) => n.group === group)
							? (needs.find((n) => n.group === group)!.quantity ?? 1)
							: 0),
						name
					]);
					program.row([[1, quantity], ...asked], '>=', 0);
				}
				program.row(
					[[1, over], [1, threshold], ...[...claim.values()].map((q): [number, string] => [-1, q])],
					'>=',
					0
				);
			}
			const whole = program.unknown('whole');
			program.row(
				[[need.peoplePerPiece ?? 1, whole], ...sum.map(([f, n]): [number, string] => [-f, n])],
				'>=',
				0
			);
			return whole;
		});
	}
}
