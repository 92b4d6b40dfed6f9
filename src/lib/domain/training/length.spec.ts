import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import planning from '../../../../tests/support/check-values/planning.json';
import programming from '../../../../tests/support/check-values/programming.json';
import { sessionLength, workSeconds, type SessionLength, type TimedBlock } from '.';

type LengthRow = {
	id: string;
	why: string;
	blocks: TimedBlock[];
	classLengthS: number;
	expect: SessionLength;
};
const lengthRows = planning.filter((row) => row.kind === 'length') as unknown as LengthRow[];
const valueOf = (key: string) => programming.find((row) => row.key === key);
const lengthOf = (block: TimedBlock) => sessionLength([block], 0).totalS;
const work = (...seconds: number[]) => seconds.map((s) => ({ seconds: s }));

describe('length of a session', () => {
	it('has the six worked instances to hold to', () => {
		expect(lengthRows.map((row) => row.id)).toEqual(['v01', 'v02', 'v03', 'v04', 'v05', 'v06']);
	});

	it.each(lengthRows)('$id: $why', ({ blocks, classLengthS, expect: expected }) => {
		expect(sessionLength(blocks, classLengthS)).toEqual(expected);
	});

	it('says any excess in whole minutes, rounded up', () => {
		const over = (s: number) =>
			sessionLength([{ format: 'free', typedS: 600 + s, prescriptions: [] }], 600).said;
		expect([0, 1, 60, 61, 240].map(over)).toEqual([
			null,
			'1 min over',
			'1 min over',
			'2 min over',
			'4 min over'
		]);
	});

	it('doubles work per side before it rounds up', () => {
		expect(workSeconds({ metres: 10, metresPerSecond: 4, perSide: true })).toBe(5);
	});

	it('is not a second longer for the dust of binary fractions', () => {
		expect(workSeconds({ reps: 10, perRepS: 1.1 })).toBe(11);
		expect(workSeconds({ reps: 3, perRepS: 1.2 })).toBe(4);
	});

	it('counts the expected reps of a set to failure', () => {
		expect(workSeconds({ expectedReps: 6, tempo: '21X1' })).toBe(30);
	});

	it('never runs blocks into one another, and sums to their total', () => {
		const block = fc.record(
			{
				format: fc.constantFrom('superset', 'rounds', 'intervals', 'timed-circuit', 'free'),
				rounds: fc.nat(12),
				waves: fc.integer({ min: 1, max: 3 }),
				restS: fc.nat(120),
				capS: fc.nat(900),
				setUpS: fc.nat(300),
				prescriptions: fc.array(fc.record({ seconds: fc.nat(90), restS: fc.nat(90) }), {
					maxLength: 5
				})
			},
			{ requiredKeys: ['format', 'prescriptions'] }
		) as fc.Arbitrary<TimedBlock>;
		fc.assert(
			fc.property(fc.array(block, { maxLength: 8 }), fc.nat(7200), (blocks, classLengthS) => {
				const { blocks: spans, totalS, slackS } = sessionLength(blocks, classLengthS);
				let at = 0;
				for (const span of spans) {
					expect(span.startS).toBe(at);
					expect(span.endS).toBeGreaterThanOrEqual(span.startS);
					at = span.endS;
				}
				expect([totalS, slackS]).toEqual([at, classLengthS - at]);
			})
		);
	});
});

describe('interval lengths of common practice', () => {
	it('eight times 20 s on and 10 s off is 240 s, of which the last rest is not ours to wait', () => {
		const tabata = valueOf('tabata')!.totalSeconds8!;
		const block: TimedBlock = {
			format: 'intervals',
			rounds: 8,
			workS: 20,
			restS: 10,
			prescriptions: work(20)
		};
		expect(lengthOf(block) + 10).toBe(tabata);
	});

	it('n minutes every minute on the minute are 60 n seconds', () => {
		expect(valueOf('emom')!.value).toContain('60n s');
		for (const rounds of [1, 8, 10, 20])
			expect(lengthOf({ format: 'every-minute', rounds, prescriptions: work(30) })).toBe(
				60 * rounds
			);
	});

	it('intervals drop the last rest of each round, as the timers that do so', () => {
		type Timer = { work: number; rest: number; stations: number; rounds: number; total: number } & {
			betweenRounds?: number;
			keepLastRest?: boolean;
			totalDropLastRest?: number;
		};
		const timers = (valueOf('interval-timer')!.value as unknown as Timer[]).map((t) => ({
			...t,
			ours: lengthOf({
				format: 'intervals',
				rounds: t.rounds,
				workS: t.work,
				restS: t.rest,
				betweenS: t.betweenRounds,
				prescriptions: work(...Array<number>(t.stations).fill(t.work))
			})
		}));
		expect(timers.map((t) => t.ours)).toEqual([960, 960, 230]);
		for (const t of timers) {
			const kept = t.keepLastRest ? t.rounds * t.rest : 0;
			expect(t.ours + kept).toBe(t.totalDropLastRest ?? t.total);
		}
	});
});
