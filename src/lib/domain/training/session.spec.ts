import { describe, expect, it } from 'vitest';
import { readSession, type SessionFault } from '.';

const prescription = (over: object = {}) => ({
	id: 'p1',
	movementId: 1,
	variationId: 11,
	sets: 3,
	reps: 8,
	perSide: false,
	tempo: '40X1',
	restS: 90,
	load: { kind: 'any' },
	...over
});
const block = (over: object = {}) => ({
	id: 'b1',
	kind: 'strength',
	format: 'straight',
	rotation: 'together',
	waves: 1,
	setUpS: 60,
	prescriptions: [prescription()],
	...over
});
const session = (...blocks: unknown[]) => ({ title: 'Squat day', aim: '', blocks });
const faultsOf = (input: unknown): string[] => {
	const read = readSession(input);
	return read.ok
		? []
		: read.faults.map(({ path, code }: SessionFault) => `${path.join('.')} ${code}`);
};
/** The fault of one block, without the path to it. */
const faultOf = (over: object) =>
	faultsOf(session(block(over))).map((f) => f.replace('blocks.0.', ''));
const faultOfPrescription = (over: object, format = 'straight') =>
	faultOf({ format, rounds: 3, capS: 60, prescriptions: [prescription(over)] }).map((f) =>
		f.replace('prescriptions.0.', '')
	);

describe('a training session from outside', () => {
	it('is read as it stands when nothing is wrong', () => {
		const input = session(block());
		expect(readSession(input)).toEqual({ ok: true, content: input });
	});

	it('names every fault with its place', () => {
		const input = session(block(), block({ format: 'rounds', prescriptions: [] }));
		expect(faultsOf(input)).toEqual([
			'blocks.1.id twice',
			'blocks.1.rounds needs-rounds',
			'blocks.1.prescriptions needs-prescription'
		]);
		expect(readSession(input)).toMatchObject({
			refused: 'session-malformed',
			detail: { faults: 3 }
		});
	});

	it.each([
		[{ format: 'superset' }, 'rounds needs-rounds'],
		[{ format: 'every-minute' }, 'rounds needs-rounds'],
		[{ format: 'intervals', rounds: 3, restS: 20 }, 'workS needs-work-time'],
		[{ format: 'intervals', rounds: 3, workS: 20 }, 'restS needs-rest-time'],
		[{ format: 'timed-circuit' }, 'capS needs-cap'],
		[{ format: 'as-many-rounds' }, 'capS needs-cap'],
		[{ format: 'for-time' }, 'capS needs-cap'],
		[{ format: 'free', prescriptions: [] }, 'typedS needs-length'],
		[{ format: 'straight', prescriptions: [] }, 'prescriptions needs-prescription']
	])('a block %j lacks its %s', (over, fault) => {
		expect(faultOf(over)).toEqual([fault]);
	});

	it('asks for no time that the coach typed away', () => {
		expect(faultOf({ format: 'for-time', typedS: 600 })).toEqual([]);
		expect(faultOf({ format: 'intervals', rounds: 3, typedS: 600 })).toEqual([]);
		expect(faultOf({ format: 'rounds', typedS: 600 })).toEqual(['rounds needs-rounds']);
	});

	it.each([
		[{ sets: undefined }, 'sets needs-sets'],
		[{ reps: undefined }, 'reps needs-work'],
		[{ expectedReps: 6 }, 'expectedReps two-measures'],
		[{ reps: undefined, metres: 400 }, 'metresPerSecond needs-speed'],
		[{ reps: undefined, calories: 12 }, 'caloriesPerMinute needs-speed'],
		[{ tempo: '4-0-X-1' }, 'tempo bad-tempo'],
		[{ load: { kind: 'kg', minKg: 16, maxKg: 12 } }, 'load upside-down'],
		[{ load: { kind: 'kg', minKg: 0, maxKg: 12 } }, 'load.minKg too-small'],
		[{ sets: 2.5 }, 'sets invalid-type'],
		[{ reps: -1 }, 'reps too-small'],
		[{ restS: -1 }, 'restS too-small'],
		[{ id: 'constructor' }, 'id bad-id'],
		[{ note: 'x'.repeat(501) }, 'note too-big'],
		[{ drop: { belowReps: 5, to: 'easier' } }, 'drop.to invalid-union']
	])('a prescription %j is faulty: %s', (over, fault) => {
		expect(faultOfPrescription(over)).toEqual([fault]);
	});

	it('lets a circuit say nothing of speed, reps or sets', () => {
		const open = { sets: undefined, reps: undefined, metres: 400 };
		expect(faultOfPrescription(open, 'timed-circuit')).toEqual([]);
		expect(faultOfPrescription({ ...open, metres: undefined }, 'as-many-rounds')).toEqual([]);
	});

	it('has at most 40 blocks of at most 30 prescriptions, and at least one block', () => {
		const many = (n: number) =>
			Array.from({ length: n }, (_, b) =>
				block({ id: `b${b}`, format: 'free', typedS: 60, prescriptions: [] })
			);
		expect(faultsOf(session(...many(40)))).toEqual([]);
		expect(faultsOf(session(...many(41)))).toEqual(['blocks too-big']);
		expect(faultsOf(session())).toEqual(['blocks too-small']);
		const prescriptions = Array.from({ length: 31 }, (_, p) => prescription({ id: `p${p}` }));
		expect(faultOf({ prescriptions })).toEqual(['prescriptions too-big']);
	});

	it('takes no field that it does not know', () => {
		expect(faultOf({ colour: 'red' })).toEqual(['blocks.0 unrecognized-keys']);
	});

	it.each([null, 7, 'session', [], { title: 'x' }])('refuses %j', (input) => {
		expect(readSession(input)).toMatchObject({ ok: false, refused: 'session-malformed' });
	});
});
