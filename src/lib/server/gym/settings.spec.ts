import { beforeEach, describe, expect, it } from 'vitest';
import { useDatabase } from '../../../../tests/support/database';
import { addPerson } from '../../../../tests/support/people';
import { viewerOf } from '../../../../tests/support/viewer';
import { listAudit } from '../audit/queries';
import { db, write } from '../db';
import { gyms, kitGroups, movements, people, rooms } from '../db/schema';
import type { Viewer } from '../guard';
import { changeSettings } from './change-settings';
import { announceFirstRun, isFirstRunCode } from './first-run-code';
import { currentGym } from './queries';
import { setUpGym } from './set-up';

const now = 1_800_000_000_000;
const settings = {
	name: 'Ropewalk Strength',
	placeName: 'Galway',
	zone: 'Europe/Dublin',
	currency: 'EUR',
	locale: 'en-IE' as const,
	loadUnit: 'kg' as const,
	weekStartsOn: 1
};

describe('the settings of a gym', () => {
	useDatabase();
	let owner: Viewer;
	beforeEach(async () => {
		owner = await viewerOf(await addPerson('owner@gym.test', ['owner']));
	});

	it('change, and the log says what differs', async () => {
		const change = { ...settings, placeName: 'Sligo', loadUnit: 'lb' as const };
		expect(await changeSettings(owner, change, { now })).toEqual({ ok: true });
		expect(await currentGym()).toMatchObject({ placeName: 'Sligo', loadUnit: 'lb' });
		expect(await listAudit({})).toMatchObject([
			{
				who: 'owner',
				verb: 'gym.change-settings',
				at: now,
				detail: { placeName: ['Galway', 'Sligo'], loadUnit: ['kg', 'lb'] }
			}
		]);
	});
});

describe('the audit log', () => {
	useDatabase();

	it('comes newest first, page by page, by person and by area', async () => {
		const owner = await viewerOf(await addPerson('owner@gym.test', ['owner']));
		const other = await viewerOf(await addPerson('other@gym.test', ['owner']));
		for (let i = 0; i < 60; i += 1) {
			const viewer = i % 2 ? owner : other;
			await changeSettings(viewer, { ...settings, name: `Gym ${i}` }, { now: now + i });
		}
		const first = await listAudit({});
		expect(first).toHaveLength(51);
		expect(first[0]?.at).toBe(now + 59);
		const second = await listAudit({ before: first[49]?.id });
		expect(second.map((row) => row.at)).toEqual(Array.from({ length: 10 }, (_, i) => now + 9 - i));
		expect(await listAudit({ actorId: other.personId })).toHaveLength(30);
		expect(await listAudit({ verb: 'gym' })).toHaveLength(51);
		expect(await listAudit({ verb: 'kit' })).toEqual([]);
	});
});

describe('the first run', () => {
	useDatabase();
	const form = (code: string) => ({
		code,
		gym: settings,
		rooms: [{ name: 'Floor', places: 16 }],
		owner: { name: 'Ada', email: 'ada@gym.test', password: 'four bells on the loft' }
	});
	const counts = async () =>
		Promise.all([gyms, rooms, people, movements, kitGroups].map(async (table) => db.$count(table)));
	const printedCode = () => {
		let printed = '';
		const print = process.stdout.write;
		process.stdout.write = (text: string | Uint8Array) => ((printed += String(text)), true);
		announceFirstRun();
		process.stdout.write = print;
		return /code ([\w-]+)/.exec(printed)?.[1] ?? '';
	};

	it('makes all of the gym by the printed code, once, and nothing by another', async () => {
		const code = printedCode();
		expect(isFirstRunCode('')).toBe(false);
		expect(await setUpGym(form('ABCD-ABCD-ABCD'), { now })).toMatchObject({
			refused: 'wrong-code'
		});
		expect(await counts()).toEqual([0, 0, 0, 0, 0]);

		expect(await setUpGym(form(code), { now })).toEqual({ ok: true });
		const [gym, room, person, movement, group] = await counts();
		expect([gym, room, person]).toEqual([1, 1, 1]);
		expect(movement).toBeGreaterThan(20);
		expect(group).toBeGreaterThan(5);
		expect(await setUpGym(form(code), { now })).toMatchObject({ refused: 'wrong-code' });
	});

	it('refuses a second gym even with a code', async () => {
		await write((tx) => tx.insert(gyms).values({ id: 1, ...settings, createdAt: now }));
		expect(await setUpGym(form(printedCode()), { now })).toMatchObject({ refused: 'gym-exists' });
	});
});
