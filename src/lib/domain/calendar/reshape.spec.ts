import { describe, expect, it } from 'vitest';
import { reshape, type Existing } from './reshape';

const slot = (slotId: number, key: string, more: Partial<Existing> = {}): Existing => ({
	slotId,
	key,
	isCalledOff: false,
	isChanged: false,
	...more
});
const wanted = [
	{ key: '2026-12-07T18:30' },
	{ key: '2026-12-09T18:30' },
	{ key: '2026-12-14T18:30' }
];

describe('a series whose rule or time changes', () => {
	it('keeps its slots by day, calls off days that fell out and adds days that are new', () => {
		const plan = reshape(
			[slot(1, '2026-12-07T18:00'), slot(2, '2026-12-08T18:00'), slot(3, '2026-12-14T18:00')],
			wanted,
			{ includeChanged: false }
		);
		expect(plan).toEqual({
			change: [
				{ slotId: 1, wanted: wanted[0] },
				{ slotId: 3, wanted: wanted[2] }
			],
			keep: [],
			callOff: [2],
			letGo: [],
			add: [wanted[1]]
		});
	});

	it('leaves slots that were changed by hand alone unless they are chosen', () => {
		const byHand = [
			slot(1, '2026-12-07T18:00', { isChanged: true }),
			slot(2, '2026-12-08T18:00', { isChanged: true })
		];
		const left = reshape(byHand, wanted, { includeChanged: false });
		expect([left.keep.map((k) => k.slotId), left.letGo, left.change, left.callOff]).toEqual([
			[1],
			[2],
			[],
			[]
		]);
		const taken = reshape(byHand, wanted, { includeChanged: true });
		expect([taken.change.map((c) => c.slotId), taken.callOff]).toEqual([[1], [2]]);
	});

	it('never brings back by itself what was called off', () => {
		const plan = reshape([slot(1, '2026-12-07T18:00', { isCalledOff: true })], wanted, {
			includeChanged: true
		});
		expect(plan.keep).toEqual([{ slotId: 1, wanted: wanted[0] }]);
		expect(plan.add).toEqual([wanted[1], wanted[2]]);
	});
});
