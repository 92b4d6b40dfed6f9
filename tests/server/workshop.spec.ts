import { and, eq, isNull } from 'drizzle-orm';
import { beforeEach, describe, expect, it } from 'vitest';
import type { SessionContent } from '../../src/lib/domain/training';
import { db, write } from '../../src/lib/server/db';
import {
	auditEntries,
	kitGroups,
	kitItems,
	movements,
	sessionRevisions,
	trainingSessions,
	variations
} from '../../src/lib/server/db/schema';
import { addGroup, archiveGroup } from '../../src/lib/server/kit/change-groups';
import {
	addItem,
	addSpell,
	archiveItem,
	changeItem,
	endSpell,
	type ItemInput
} from '../../src/lib/server/kit/change-items';
import { inServiceDuring, kitRegister } from '../../src/lib/server/kit/in-service';
import { library } from '../../src/lib/server/kit/library';
import {
	addMovement,
	archiveMovement,
	saveMovement,
	type MovementInput
} from '../../src/lib/server/movements/save';
import { addSession, saveSession } from '../../src/lib/server/sessions/save';
import { useDatabase } from '../support/database';
import { everyRow } from '../support/digest';
import { acting, addSpecGym, specNow, type SpecGym } from '../support/gym';

const now = specNow;
const hour = 3_600_000;
let gym: SpecGym;
let head: ReturnType<typeof acting>;
let barGroup: { id: number };
let barItem: typeof kitItems.$inferSelect;

/** What a command refuses leaves every row of every table as it was. */
async function refuses(command: () => Promise<object>, code: string) {
	const before = await everyRow();
	expect(await command()).toMatchObject({ ok: false, refused: code });
	expect(await everyRow()).toBe(before);
}
const verbs = async () => (await db.select().from(auditEntries)).map(({ verb }) => verb);

async function atWork() {
	gym = await addSpecGym();
	head = acting(gym.deskId, 'head_coach');
	const groups = await db.select().from(kitGroups).where(eq(kitGroups.name, 'bar place'));
	barGroup = groups[0]!;
	const items = await db.select().from(kitItems).where(eq(kitItems.kitGroupId, barGroup.id));
	barItem = items[0]!;
}

describe('the kit register', () => {
	useDatabase();
	beforeEach(atWork);
	const pieces = (given: Partial<ItemInput> = {}): ItemInput => ({
		kitGroupId: barGroup.id,
		loadKg: null,
		count: 2,
		roomId: null,
		note: null,
		...given
	});
	const loaded = async () => {
		const input = { name: 'kettlebell', plural: 'kettlebells', hasLoads: true };
		const made = await addGroup(head, input, { now });
		if (!made.ok) throw new Error(made.refused);
		return made.id;
	};

	it('takes a kind of kit with its pieces, and each step is in the audit log', async () => {
		const kitGroupId = await loaded();
		const made = await addItem(head, pieces({ kitGroupId, loadKg: 16 }), { now });
		expect(made).toMatchObject({ ok: true });
		expect(await verbs()).toEqual(['kit.add-group', 'kit.add-item']);
		const found = await db.select().from(kitItems).where(eq(kitItems.kitGroupId, kitGroupId));
		expect(found).toMatchObject([{ loadKg: 16, count: 2, roomId: null }]);
	});

	it('refuses a kind that there is, whatever its capitals', () =>
		refuses(
			() => addGroup(head, { name: 'BAR Place', plural: 'x', hasLoads: false }, { now }),
			'name-taken'
		));

	it('keeps a kind that has pieces or that a movement needs', async () => {
		await refuses(() => archiveGroup(head, barGroup.id, { now }), 'group-in-use');
		await archiveItem(head, barItem.id, { now });
		await refuses(() => archiveGroup(head, barGroup.id, { now }), 'group-in-use');
		await archiveMovement(head, gym.movementId, { now });
		await write((tx) => tx.update(variations).set({ archivedAt: now }));
		expect(await archiveGroup(head, barGroup.id, { now })).toEqual({ ok: true });
		await refuses(() => archiveGroup(head, barGroup.id, { now }), 'not-found');
	});

	it('refuses pieces that the plan could not count', async () => {
		const kitGroupId = await loaded();
		await refuses(() => addItem(head, pieces({ kitGroupId: 999 }), { now }), 'not-found');
		await refuses(() => addItem(head, pieces({ loadKg: 8 }), { now }), 'load-unwanted');
		await refuses(() => addItem(head, pieces({ kitGroupId }), { now }), 'load-missing');
		await refuses(() => addItem(head, pieces(), { now }), 'same-item');
		await addItem(head, pieces({ kitGroupId, loadKg: 16 }), { now });
		await refuses(
			() => addItem(head, pieces({ kitGroupId, loadKg: 20, roomId: gym.roomId }), { now }),
			'housing'
		);
	});

	it('counts out what is out, and no more than there is', async () => {
		const out = (given: object) => ({
			kitItemId: barItem.id,
			count: 1,
			fromAt: now,
			toAt: null,
			why: 'a loose bolt',
			...given
		});
		await refuses(() => addSpell(head, out({ count: 5 }), { now }), 'more-than-owned');
		await refuses(() => addSpell(head, out({ toAt: now }), { now }), 'ends-before-start');
		await refuses(() => addSpell(head, out({ kitItemId: 99 }), { now }), 'not-found');
		const spell = await addSpell(head, out({ count: 3 }), { now });
		if (!spell.ok) throw new Error(spell.refused);
		const inService = async (at: number) => {
			const register = await kitRegister(at, at + hour);
			const kit = inServiceDuring(register, await library(), at, at + hour);
			return kit.find(({ id }) => id === String(barItem.id))?.inService;
		};
		expect(await inService(now + hour)).toBe(1);
		await refuses(
			() => changeItem(head, barItem.id, { ...pieces(), count: 2 }, { now }),
			'fewer-than-out'
		);
		expect(await endSpell(head, spell.id, { now: now + 2 * hour })).toEqual({ ok: true });
		expect(await inService(now + 3 * hour)).toBe(4);
		await refuses(() => endSpell(head, spell.id, { now: now + 3 * hour }), 'not-found');
	});
});

describe('movements and their ladders', () => {
	useDatabase();
	beforeEach(atWork);
	const need = (given: object = {}) => ({
		kitGroupId: barGroup.id,
		quantity: 1,
		peoplePerPiece: 1,
		...given
	});
	const chin = (given: Partial<MovementInput> = {}): MovementInput => ({
		name: 'Chin-up',
		pattern: 'vertical pull',
		muscles: ['back'],
		perSide: false,
		secondsPerRep: 3,
		cues: '',
		cautions: '',
		ladder: [
			{ id: null, name: 'Strict', needs: [need()] },
			{ id: null, name: 'Prone row', needs: [] }
		],
		...given
	});
	const save = (input: MovementInput, basedOn: number, id = gym.movementId) =>
		saveMovement(head, id, input, { basedOn, now });
	const rungs = (movementId: number) =>
		db
			.select({ id: variations.id, name: variations.name, rung: variations.rung })
			.from(variations)
			.where(and(eq(variations.movementId, movementId), isNull(variations.archivedAt)))
			.orderBy(variations.rung);

	it('refuses what cannot be a ladder', async () => {
		const rung = (needs: MovementInput['ladder'][number]['needs']) =>
			chin({ ladder: [{ id: null, name: 'Strict', needs }] });
		await refuses(() => addMovement(head, chin({ ladder: [] }), { now }), 'no-rung');
		await refuses(() => addMovement(head, chin({ name: 'PULL-UP' }), { now }), 'name-taken');
		await refuses(
			() => addMovement(head, rung([need({ kitGroupId: 99 })]), { now }),
			'unknown-group'
		);
		await refuses(() => addMovement(head, rung([need(), need()]), { now }), 'group-twice');
		await refuses(
			() => addMovement(head, rung([need({ quantity: 2, peoplePerPiece: 2 })]), { now }),
			'sharing'
		);
	});

	it('keeps the rungs that stay, in their new order, and archives those left out', async () => {
		const [strict, ring, floor] = await rungs(gym.movementId);
		const ladder = [
			{ id: floor!.id, name: 'Prone row', needs: [] },
			{ id: strict!.id, name: 'Strict', needs: [need()] },
			{ id: null, name: 'Band row', needs: [] }
		];
		const [row] = await db.select().from(movements).where(eq(movements.id, gym.movementId));
		expect(await save(chin({ name: 'Pull-up', ladder }), row!.version)).toMatchObject({ ok: true });
		expect(await rungs(gym.movementId)).toMatchObject([
			{ id: floor!.id, rung: 0 },
			{ id: strict!.id, rung: 1 },
			{ name: 'Band row', rung: 2 }
		]);
		const [gone] = await db.select().from(variations).where(eq(variations.id, ring!.id));
		expect(gone?.archivedAt).toBe(now);
		const lib = await library();
		expect(lib.movements[gym.movementId]?.ladder.map(({ name }) => name)).toContain('Band row');
		await refuses(() => save(chin({ name: 'Pull-up' }), row!.version), 'changed-meanwhile');
	});

	it('refuses a movement that is not there, or no longer', async () => {
		await refuses(() => save(chin(), 1, 999), 'not-found');
		await archiveMovement(head, gym.movementId, { now });
		await refuses(() => save(chin(), 1), 'not-found');
		await refuses(() => archiveMovement(head, gym.movementId, { now }), 'not-found');
	});
});

describe('sessions and their revisions', () => {
	useDatabase();
	beforeEach(atWork);
	const written = async (): Promise<SessionContent> => {
		const [row] = await db.select().from(sessionRevisions);
		return row!.content;
	};
	const other = acting(1, 'head_coach');
	const draft = (content: unknown, given: object = {}) => ({
		content,
		lengthMin: 60,
		programmeId: null,
		basedOn: 1,
		now,
		...given
	});
	const sessionId = async () => (await db.select().from(trainingSessions))[0]!.id;

	it('saves a new revision and leaves the one before as it was', async () => {
		const content = await written();
		const saved = await saveSession(
			head,
			await sessionId(),
			draft({ ...content, aim: 'Own the top' })
		);
		expect(saved).toMatchObject({ ok: true, number: 2 });
		const rows = await db.select().from(sessionRevisions);
		expect(rows.map((row) => row.content.aim)).toEqual([content.aim, 'Own the top']);
		expect(await verbs()).toEqual(['sessions.save']);
	});

	it('cannot change a revision that was saved, whoever asks the database', async () => {
		const change = write((tx) => tx.update(sessionRevisions).set({ number: 9 }));
		await expect(change).rejects.toThrow();
	});

	it('tells the second of two who save one session who was first, and loses nothing of either', async () => {
		const content = await written();
		const id = await sessionId();
		await saveSession(head, id, draft({ ...content, aim: 'Mine' }));
		await refuses(
			() => saveSession(other, id, draft({ ...content, aim: 'Yours' })),
			'saved-meanwhile'
		);
		const refused = await saveSession(other, id, draft({ ...content, aim: 'Yours' }));
		expect(refused).toMatchObject({ detail: { who: 'Brid', number: 2 } });
		const over = draft({ ...content, aim: 'Yours' }, { overwrite: true });
		expect(await saveSession(other, id, over)).toMatchObject({ ok: true, number: 3 });
		const rows = await db.select().from(sessionRevisions);
		expect(rows.map((row) => row.content.aim)).toEqual([content.aim, 'Mine', 'Yours']);
	});

	it('refuses what is no session, each fault with its place', async () => {
		const content = await written();
		await refuses(() => addSession(head, draft({})), 'session-malformed');
		await refuses(() => addSession(head, draft({ ...content, title: ' ' })), 'session-malformed');
		const [block] = content.blocks;
		const many = Array.from({ length: 41 }, (_, i) => ({
			...block!,
			id: `b${i}`,
			prescriptions: []
		}));
		await refuses(() => addSession(head, draft({ ...content, blocks: many })), 'session-malformed');
		const tempo = [{ ...block!, prescriptions: [{ ...block!.prescriptions[0]!, tempo: '3-1' }] }];
		const refused = await addSession(head, draft({ ...content, blocks: tempo }));
		expect(refused).toMatchObject({
			refused: 'session-malformed',
			faults: [{ path: ['blocks', 0, 'prescriptions', 0, 'tempo'], code: 'bad-tempo' }]
		});
	});

	it('refuses kit that nobody has, and movements that are not there', async () => {
		const content = await written();
		const [block] = content.blocks;
		const asks = (given: object) =>
			draft({
				...content,
				blocks: [{ ...block!, prescriptions: [{ ...block!.prescriptions[0]!, ...given }] }]
			});
		await refuses(() => addSession(head, asks({ movementId: 99 })), 'unknown-movement');
		await refuses(() => addSession(head, asks({ variationId: 99 })), 'unknown-variation');
		await archiveItem(head, barItem.id, { now });
		await refuses(() => addSession(head, draft(content)), 'kit-nobody-has');
	});
});
