import { describe, expect, it } from 'vitest';
import { asSent, copyBlock, emptyDraft, moveIn, newBlock, newPrescription } from './draft';

const movement = {
	id: 7,
	name: 'Press-up',
	pattern: 'horizontal push',
	perSide: false,
	secondsPerRep: 3,
	ladder: [
		{ id: 70, name: 'Old way', archived: true, needs: [] },
		{ id: 71, name: 'Full', archived: false, needs: [] }
	]
};

describe('a session being written', () => {
	it('never gives one id twice, also after something was taken away', () => {
		const draft = emptyDraft();
		draft.blocks.push(newBlock(draft, 'strength'), newBlock({ ...draft, blocks: [] }, 'finisher'));
		draft.blocks[1]!.id = 'b2';
		draft.blocks.shift();
		expect(newBlock(draft, 'skill').id).not.toBe('b2');
	});

	it('copies a block with ids of its own', () => {
		const draft = emptyDraft();
		draft.blocks.push(newBlock(draft, 'strength'));
		draft.blocks[0]!.prescriptions.push(newPrescription(draft, movement));
		const copy = copyBlock(draft, 0);
		expect(copy.id).toBe('b2');
		expect(copy.prescriptions[0]!.id).toBe('p2');
		expect(draft.blocks[0]!.prescriptions[0]!.variationId).toBe(71);
	});

	it('moves within its bounds', () => {
		const items = ['a', 'b', 'c'];
		moveIn(items, 0, -1);
		moveIn(items, 0, 1);
		moveIn(items, 2, 1);
		expect(items).toEqual(['b', 'a', 'c']);
	});

	it('leaves out what was emptied', () => {
		const draft = emptyDraft();
		draft.title = 'T';
		draft.blocks.push({ ...newBlock(draft, 'finisher'), title: '', capS: NaN });
		expect(asSent(draft).blocks[0]).not.toHaveProperty('capS');
		expect(asSent(draft).blocks[0]).not.toHaveProperty('title');
	});
});
