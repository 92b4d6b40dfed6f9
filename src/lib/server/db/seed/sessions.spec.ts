import { describe, expect, it } from 'vitest';
import { readSession, sessionLength } from '$lib/domain/training';
import { useDatabase } from '../../../../../tests/support/database';
import { write } from '..';
import { addLibrary } from './library';
import { build } from './session-builder';
import { sessionData } from './session-data';

describe('the demo gym’s sessions', () => {
	useDatabase();

	it('are twenty-four, readable, and fit their class with at most six minutes of slack', async () => {
		const library = await write((tx) => addLibrary(tx, { now: 1 }));
		const rows = sessionData.map((draft) => {
			const content = build(draft, library);
			const read = readSession(content);
			const { totalS, slackS } = sessionLength(content.blocks, draft.lengthMin * 60);
			return { title: draft.title, ok: read.ok ? 'ok' : read.faults, totalS, slackS };
		});
		expect(rows.filter(({ ok }) => ok !== 'ok')).toEqual([]);
		expect(rows.filter(({ slackS }) => slackS < 0 || slackS > 360)).toEqual([]);
		expect(rows).toHaveLength(24);
	});
});
