import { describe, expect, it } from 'vitest';
import {
	checkChoices,
	claimantOf,
	dropSaid,
	effortOf,
	keepChoices,
	readSession,
	sessionPlan,
	secondsPerRep,
	stationsOf,
	type MovementLibrary,
	type SessionContent
} from '.';

const need = (group: string, quantity = 1, peoplePerPiece = 1) => ({
	group,
	quantity,
	peoplePerPiece
});
const names: Record<number, string> = {
	21: 'strict',
	22: 'banded',
	23: 'lowering',
	24: 'ring row'
};
/** Press, pull-up, row, step-up, plank, skip. Groups: 1 dumbbells, 2 bar places, 3 bands, 4 boxes, 5 rings, 6 rowers. */
const library: MovementLibrary = {
	1: {
		secondsPerRep: 3,
		ladder: [
			{ id: 11, needs: [need('1', 2)] },
			{ id: 12, needs: [need('3')] }
		]
	},
	2: {
		secondsPerRep: 4,
		ladder: [
			{ id: 21, needs: [need('2')] },
			{ id: 22, needs: [need('2'), need('3')] },
			{ id: 23, needs: [need('2'), need('4')] },
			{ id: 24, needs: [need('5')] }
		]
	},
	3: { secondsPerRep: 2, ladder: [{ id: 31, needs: [need('6', 1, 2)] }] },
	4: {
		secondsPerRep: 3,
		ladder: [
			{ id: 41, needs: [need('4')] },
			{ id: 42, needs: [] }
		]
	},
	5: { secondsPerRep: 2, ladder: [{ id: 51, needs: [] }] },
	6: { secondsPerRep: 1, ladder: [{ id: 61, needs: [] }] }
};

const read = (input: unknown): SessionContent => {
	const result = readSession(input);
	if (!result.ok) throw new Error(JSON.stringify(result.faults));
	return result.content;
};
const one = (id: string, movementId: number, variationId: number, over: object = {}) => ({
	id,
	movementId,
	variationId,
	perSide: false,
	load: { kind: 'any' },
	...over
});
const plain = { rotation: 'together', waves: 1, setUpS: 60 };

/**
 * A session of the trade's usual parts (common practice, no source): a four-round opener, a superset
 * of four sets, press of 8 per arm and pull-up at 2-1-X-1 with 60 s after each, and two 8-minute
 * continuous circuits with a short break. Such a session runs about 40 minutes to an hour in full.
 */
const usual = read({
	title: 'Press and pull',
	aim: 'Strong overhead, strong on the bar',
	blocks: [
		{ ...plain, id: 'b1', kind: 'warm-up', format: 'free', typedS: 480, prescriptions: [] },
		{
			...plain,
			id: 'b2',
			kind: 'opener',
			format: 'rounds',
			rounds: 4,
			prescriptions: [
				one('skip', 6, 61, { seconds: 30, restS: 10 }),
				one('plank', 5, 51, { seconds: 30, restS: 10 }),
				one('step', 4, 41, { reps: 10, restS: 30 })
			]
		},
		{
			...plain,
			id: 'b3',
			kind: 'strength',
			format: 'superset',
			rounds: 4,
			prescriptions: [
				one('press', 1, 11, {
					reps: 8,
					perSide: true,
					restS: 60,
					load: { kind: 'kg', minKg: 8, maxKg: 16 }
				}),
				one('pull', 2, 21, {
					expectedReps: 6,
					tempo: '21X1',
					restS: 60,
					drop: { belowReps: 5, to: 22, note: 'No band free: lower for 3 to 6 s, 5 reps' }
				})
			]
		},
		{
			...plain,
			rotation: 'split',
			waves: 1,
			setUpS: 120,
			id: 'b4',
			kind: 'circuit',
			format: 'timed-circuit',
			capS: 480,
			repeats: 2,
			betweenS: 90,
			prescriptions: [one('row', 3, 31), one('step2', 4, 41), one('plank2', 5, 51)]
		},
		{
			...plain,
			setUpS: 0,
			id: 'b5',
			kind: 'cool-down',
			format: 'free',
			typedS: 240,
			prescriptions: []
		}
	]
});

describe('a session of the usual parts', () => {
	const plan = sessionPlan(usual, 3600, secondsPerRep(library));

	it('works its superset out to 13 and a half minutes with set-up', () => {
		// By hand: press 8 x 3 s x 2 arms = 48 s, pull-up 6 x 5 s = 30 s, 60 s after each, the last rest dropped.
		const { startS, endS } = plan.blocks[2]!;
		expect(endS - startS).toBe(60 + 4 * (48 + 60 + 30 + 60) - 60);
	});

	it('works its circuits out to two times 8 minutes, the break and the set-up', () => {
		const { startS, endS } = plan.blocks[3]!;
		expect(endS - startS).toBe(120 + 480 + 90 + 480);
	});

	it('runs about 40 minutes to an hour in full', () => {
		expect(plan.totalS).toBeGreaterThanOrEqual(40 * 60);
		expect(plan.totalS).toBeLessThanOrEqual(60 * 60);
		expect(plan).toMatchObject({ totalS: 3272, slackS: 328, said: null });
	});

	it('shows its effort by the kind of block, the warm-up easiest', () => {
		expect(plan.blocks.map((b) => b.effort)).toEqual([1, 3, 4, 3, 1]);
		expect(effortOf.finisher).toBe(5);
		expect(effortOf.skill).toBe(2);
	});

	it('takes two more seconds a rep where the coach typed them', () => {
		const slower = structuredClone(usual);
		slower.blocks[2]!.prescriptions[0]!.perRepS = 5;
		expect(sessionPlan(slower, 3600, secondsPerRep(library)).totalS).toBe(3272 + 4 * 32);
	});

	it('drops a pull-up below 5 reps to the band, and says what to do without one', () => {
		const { drop, variationId } = usual.blocks[2]!.prescriptions[1]!;
		const ladder = library[2]!.ladder.map(({ id }) => ({ id, name: names[id]! }));
		expect(dropSaid(drop!, variationId, ladder)).toEqual({
			belowReps: 5,
			toName: 'banded',
			note: 'No band free: lower for 3 to 6 s, 5 reps'
		});
	});

	it('drops to the next rung below the one in hand, and to nothing at the foot of the ladder', () => {
		const next = { belowReps: 5, to: 'next-regression' } as const;
		const ladder = library[2]!.ladder.map(({ id }) => ({ id, name: names[id]! }));
		expect([21, 22, 24, 99].map((id) => dropSaid(next, id, ladder).toName)).toEqual([
			'banded',
			'lowering',
			null,
			null
		]);
	});
});

describe('what a session asks of the kit', () => {
	it('is its blocks with prescriptions, on the clock, a station for each', () => {
		const result = stationsOf(usual, library);
		if (!result.ok) throw new Error(result.refused);
		expect(
			result.blocks.map((b) => [b.id, b.startS, b.endS, b.rotation, b.stations.length])
		).toEqual([
			['b2', 480, 1070, 'together', 3],
			['b3', 1070, 1862, 'together', 2],
			['b4', 1862, 3032, 'split', 3]
		]);
		expect(result.blocks[1]!.stations[1]).toEqual({
			id: 'pull',
			ladder: [
				{ id: '21', needs: [need('2')] },
				{ id: '22', needs: [need('2'), need('3')] },
				{ id: '23', needs: [need('2'), need('4')] },
				{ id: '24', needs: [need('5')] }
			],
			asWritten: 0
		});
	});

	it('starts and ends where the ribbon shows its blocks', () => {
		const result = stationsOf(usual, library);
		const plan = sessionPlan(usual, 3600, secondsPerRep(library));
		const times = (blocks: { id: string; startS: number; endS: number }[]) =>
			blocks.map(({ id, startS, endS }) => [id, startS, endS]);
		expect(result.ok && times(result.blocks)).toEqual(times(plan.blocks.slice(1, 4)));
	});

	it('is refused where the library lacks a movement or a rung', () => {
		const without = (movementId: number) => ({ ...library, [movementId]: undefined });
		expect(stationsOf(usual, without(2))).toMatchObject({
			refused: 'unknown-movement',
			detail: { prescription: 'pull', movementId: 2 }
		});
		expect(stationsOf(usual, { ...library, 4: { secondsPerRep: 3, ladder: [] } })).toMatchObject({
			refused: 'unknown-variation',
			detail: { prescription: 'step', variationId: 41 }
		});
	});
});

describe('what a booking asks of the kit', () => {
	const loaded = new Set(['1']);

	it('is the range as written, of the groups that have loads alone', () => {
		expect(claimantOf('k1', {}, usual, library, loaded)).toEqual({
			id: 'k1',
			variations: {},
			loads: { press: { '1': [8, 16] } }
		});
	});

	it('is the chosen rung and load where somebody chose', () => {
		const choices = { variations: { pull: 24, plank: 99 }, loads: { press: 12 } };
		expect(claimantOf('k1', choices, usual, library, loaded)).toEqual({
			id: 'k1',
			variations: { pull: 3 },
			loads: { press: { '1': [12, 12] } }
		});
		expect(claimantOf('k1', { loads: { press: [10, 12] } }, usual, library, loaded).loads).toEqual({
			press: { '1': [10, 12] }
		});
	});

	it('is refused for what the session does not have, and for a range upside down', () => {
		expect(
			checkChoices({ variations: { pull: 24 }, loads: { press: [8, 12] } }, usual, library)
		).toEqual({ ok: true });
		expect(checkChoices({ variations: { pull: 11 } }, usual, library)).toMatchObject({
			refused: 'unknown-choice',
			detail: { prescription: 'pull' }
		});
		expect(checkChoices({ variations: { squat: 11 } }, usual, library)).toMatchObject({
			refused: 'unknown-choice'
		});
		for (const load of [
			[12, 8],
			[0, 8],
			[8, 501],
			[NaN, 8]
		] as [number, number][])
			expect(checkChoices({ loads: { press: load } }, usual, library)).toMatchObject({
				refused: 'bad-load'
			});
	});

	it('keeps the choices that still exist under a new revision, and names the rest', () => {
		const revised = structuredClone(usual);
		revised.blocks[2]!.prescriptions.shift();
		const choices = { variations: { pull: 23, press: 12 }, loads: { press: 12 } };
		expect(keepChoices(choices, revised, library)).toEqual({
			kept: { variations: { pull: 23 }, loads: {} },
			dropped: ['press']
		});
	});
});
