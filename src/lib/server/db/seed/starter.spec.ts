import { describe, expect, it } from 'vitest';
import { movementForm } from '$lib/forms/movement';
import { useDatabase } from '../../../../../tests/support/database';
import { db, write } from '..';
import { kitGroups, kitItems, movements, patterns, variationNeeds, variations } from '../schema';
import { groups } from './kit-data';
import { movementData } from './movement-data';
import { addStarterLibrary, starterNames } from './starter';

describe('the starter library of a new gym', () => {
	useDatabase();

	it('has thirty movements of every pattern, every kind of kit, and no pieces that nobody counted', async () => {
		await write((tx) => addStarterLibrary(tx, { now: 5 }));
		const all = await db.select().from(movements);
		expect(all.map(({ name }) => name).sort()).toEqual([...starterNames].sort());
		expect(all).toHaveLength(30);
		expect(new Set(all.map(({ pattern }) => pattern))).toEqual(new Set(patterns));
		expect(await db.$count(kitGroups)).toBe(Object.keys(groups).length);
		expect(await db.$count(kitItems)).toBe(0);
	});

	it('keeps each ladder hardest first, and says where every rung needs kit', async () => {
		await write((tx) => addStarterLibrary(tx, { now: 5 }));
		const rungs = await db.select().from(variations);
		const needy = new Set((await db.select().from(variationNeeds)).map((n) => n.variationId));
		for (const movement of await db.select().from(movements)) {
			const own = rungs.filter((r) => r.movementId === movement.id).sort((a, b) => a.rung - b.rung);
			expect(own.map(({ rung }) => rung)).toEqual(own.map((_, i) => i));
			expect(movement.alwaysNeedsKit, movement.name).toBe(own.every(({ id }) => needy.has(id)));
		}
	});
});

describe('the movements', () => {
	it('can each be saved again by the form that edits them', () => {
		const ids = Object.keys(groups);
		for (const { ladder, muscles, perSide, ...movement } of movementData) {
			const rungs = ladder.map(({ name, needs }) => ({
				name,
				needs: needs.map(({ group, ...n }) => ({ ...n, kitGroupId: ids.indexOf(group) + 1 }))
			}));
			const typed = { ...movement, muscles: muscles.join(' '), basedOn: 0, ladder: rungs };
			const read = movementForm.safeParse(perSide ? { ...typed, perSide: 'on' } : typed);
			expect(read.error?.issues ?? [], movement.name).toEqual([]);
			expect(read.data?.input.ladder.map(({ needs }) => needs)).toEqual(rungs.map((r) => r.needs));
			expect(read.data?.input.perSide).toBe(perSide);
		}
	});

	it('are sixty, each with cues, cautions and muscles, and nearly all end without kit', () => {
		expect(movementData).toHaveLength(60);
		expect(new Set(movementData.map(({ name }) => name)).size).toBe(60);
		for (const { name, cues, cautions, muscles } of movementData) {
			expect(cues.length, name).toBeGreaterThan(8);
			expect(cautions.length, name).toBeGreaterThan(8);
			expect(muscles.length, name).toBeGreaterThan(0);
		}
		const endBare = movementData.filter(({ ladder }) => ladder.at(-1)!.needs.length === 0);
		expect(endBare.length).toBeGreaterThanOrEqual(54);
		expect(endBare.length).toBeLessThan(60);
	});
});
