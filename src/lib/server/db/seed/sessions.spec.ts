import { describe, expect, it } from 'vitest';
import { readSession, secondsPerRep, sessionPlan } from '$lib/domain/training';
import { formats } from '$lib/domain/training/length';
import { useDatabase } from '../../../../../tests/support/database';
import { library } from '../../kit/library';
import { write } from '..';
import { addLibrary } from './library';
import { build } from './session-builder';
import { sessionData } from './session-data';

async function built() {
	const seeded = await write((tx) => addLibrary(tx, { now: 1 }));
	const reps = secondsPerRep((await library()).rules);
	return sessionData.map((draft) => {
		const content = build(draft, seeded);
		const { slackS } = sessionPlan(content, draft.lengthMin * 60, reps);
		return { ...draft, content, slackMin: slackS / 60 };
	});
}

describe('the demo gym’s sessions', () => {
	useDatabase();

	it('are twenty-four in three programmes, each readable', async () => {
		const all = await built();
		expect(all).toHaveLength(24);
		expect(new Set(all.map(({ programme }) => programme)).size).toBe(3);
		for (const { content, title } of all)
			expect(readSession(content), title).toEqual({ ok: true, content });
	});

	it('fit their class with at most six minutes left', async () => {
		const slack = (await built()).map(({ title, slackMin }) => ({ title, slackMin }));
		expect(slack.filter(({ slackMin }) => slackMin < 0 || slackMin > 6)).toEqual([]);
	});

	it('use every format, tempo, sides, waves, both rotations and both kinds of drop rule', async () => {
		const blocks = (await built()).flatMap(({ content }) => content.blocks);
		const prescriptions = blocks.flatMap((block) => block.prescriptions);
		expect(new Set(blocks.map(({ format }) => format))).toEqual(new Set(formats));
		expect(new Set(blocks.map(({ rotation }) => rotation))).toEqual(new Set(['together', 'split']));
		expect(blocks.some(({ waves }) => waves > 1)).toBe(true);
		expect(prescriptions.some(({ tempo, perSide }) => tempo && perSide)).toBe(true);
		const drops = prescriptions.flatMap(({ drop }) => (drop ? [typeof drop.to] : []));
		expect(new Set(drops)).toEqual(new Set(['string', 'number']));
	});

	it('say how much of each movement is done wherever no clock of the block does', async () => {
		const blocks = (await built()).flatMap(({ content }) => content.blocks);
		const bare = blocks
			.filter(({ format }) => format !== 'intervals')
			.flatMap(({ title, prescriptions }) =>
				prescriptions
					.filter((p) => !(p.reps ?? p.expectedReps ?? p.seconds ?? p.metres ?? p.calories))
					.map(({ id }) => `${title} ${id}`)
			);
		expect(bare).toEqual([]);
	});
});
