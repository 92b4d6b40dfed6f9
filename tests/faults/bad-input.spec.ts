import { createClient } from '@libsql/client';
import { eq } from 'drizzle-orm';
import { describe, expect, it } from 'vitest';
import { addDays } from '../../src/lib/domain/calendar/civil-date';
import { write } from '../../src/lib/server/db';
import { passes, people, personRoles, slots } from '../../src/lib/server/db/schema';
import { addSlot, addSpecGym, type SpecGym } from '../support/gym';
import { mintSignIns } from '../support/mint';
import { useServer } from '../support/use-server';

const today = new Date().toISOString().slice(0, 10);
const ahead = addDays(today, 3);

describe('bad input at the built server: one code on the page and in the API, and no row changed', () => {
	let gym: SpecGym;
	const slotIds: Record<string, number> = {};
	let [member, passless, head]: string[] = [];

	const server = useServer(async () => {
		gym = await addSpecGym();
		const person = (email: string, role: 'member' | 'head_coach') =>
			write(async (tx) => {
				const row = { name: email, email, createdAt: 1 };
				const { id } = await tx.insert(people).values(row).returning().get();
				await tx.insert(personRoles).values({ personId: id, role, grantedAt: 1 });
				return id;
			});
		const ids = [
			await person('ann@gym.test', 'member'),
			await person('bob@gym.test', 'member'),
			await person('head@gym.test', 'head_coach')
		];
		const pass = {
			kind: 'membership',
			name: 'Pass',
			startsOn: '2026-01-01',
			createdAt: 1
		} as const;
		await write((tx) => tx.insert(passes).values({ ...pass, personId: ids[0]! }));
		[member, passless, head] = await mintSignIns(ids);
		slotIds.open = await addSlot(gym, { on: ahead, time: '06:30' });
		slotIds.beside = await addSlot(gym, {
			on: ahead,
			time: '07:00',
			roomId: gym.loftId,
			coachId: null
		});
		slotIds.past = await addSlot(gym, { on: addDays(today, -1) });
		slotIds.early = await addSlot(gym, { on: addDays(today, 100) });
		slotIds.cancelled = await addSlot(gym, { on: ahead, time: '12:15' });
		await write((tx) =>
			tx.update(slots).set({ cancelledAt: 1 }).where(eq(slots.id, slotIds.cancelled!))
		);
	});

	const post = (path: string, cookie: string | undefined, body: string, type: string) =>
		fetch(server().url + path, {
			method: 'POST',
			redirect: 'manual',
			headers: {
				accept: type.includes('json') ? 'application/json' : 'text/html',
				cookie: cookie ?? '',
				origin: server().origin,
				'content-type': type
			},
			body
		});
	const api = async (slotId: number, cookie = member) => {
		const path = `/api/slots/${slotId}/bookings`;
		const answer = await post(path, cookie, '{}', 'application/json');
		const said = (await answer.json()) as { code?: string; detail?: string };
		return { status: answer.status, code: said.code, sentence: said.detail };
	};
	const page = async (path: string, fields: [string, string][], cookie = member) => {
		const body = new URLSearchParams(fields).toString();
		const answer = await post(path, cookie, body, 'application/x-www-form-urlencoded');
		return { status: answer.status, html: await answer.text() };
	};

	/** How many rows each table has, as another reader of the file sees them. */
	async function counts(): Promise<string> {
		const client = createClient({ url: `file:${server().databaseFile}` });
		const { rows } = await client.execute(
			"select name from sqlite_master where type = 'table' and name not like 'sqlite_%' order by name"
		);
		const all = [];
		for (const { name } of rows) {
			const counted = await client.execute(`select count(*) n from "${String(name)}"`);
			all.push([name, Number(counted.rows[0]!.n)]);
		}
		client.close();
		return JSON.stringify(all);
	}

	it.each([
		['a class that is over', 'past', 'past'],
		['a class whose booking is not open yet', 'early', 'not-open-yet'],
		['a class that was called off', 'cancelled', 'cancelled']
	])('refuses %s', async (_, slot, code) => {
		const before = await counts();
		const slotId = slotIds[slot]!;
		const said = await api(slotId);
		expect(said).toMatchObject({ status: 409, code });
		const shown = await page(`/classes/${slotId}?/book`, []);
		expect(shown.status).toBe(409);
		expect(shown.html).toContain(said.sentence);
		expect(await counts()).toBe(before);
	});

	it('refuses a member without a pass, and says what helps', async () => {
		const before = await counts();
		const said = await api(slotIds.open!, passless);
		expect(said).toMatchObject({ status: 409, code: 'no-pass' });
		const shown = await page(`/classes/${slotIds.open}?/book`, [], passless);
		expect(shown.html).toContain(said.sentence);
		expect(await counts()).toBe(before);
	});

	it('books a doubled click once, and refuses a class at the same time', async () => {
		const path = `/classes/${slotIds.open}?/book`;
		const twice = await Promise.all([page(path, []), page(path, [])]);
		expect(twice.map(({ status }) => status).sort()).toEqual([303, 409]);
		const before = await counts();
		expect(await api(slotIds.open!)).toMatchObject({ status: 409, code: 'already-booked' });
		expect(await api(slotIds.beside!)).toMatchObject({ status: 409, code: 'overlapping' });
		expect(await counts()).toBe(before);
	});

	it.each([
		[
			'a rule that cannot be read',
			[
				['repeats', 'typed'],
				['typedRule', 'FREQ=SOMETIMES']
			]
		],
		[
			'a rule that could run for ever',
			[
				['repeats', 'typed'],
				['typedRule', 'FREQ=SECONDLY;COUNT=1000000000']
			]
		],
		[
			'a series that ends before it starts',
			[
				['days', 'MO'],
				['ends', 'until'],
				['untilOn', today]
			]
		],
		['a series without a day', []],
		[
			'a room that is not there',
			[
				['days', 'MO'],
				['roomId', '999']
			]
		]
	] as [string, [string, string][]][])(
		'refuses %s, and keeps what was typed',
		async (_, fields) => {
			const before = await counts();
			const typed = new Map<string, string>([
				['classTypeId', String(gym.classTypeId)],
				['roomId', String(gym.roomId)],
				['coachIds', String(gym.coachId)],
				['startsOn', addDays(today, 7)],
				['startTime', '05:55'],
				['lengthMin', '47'],
				...fields
			]);
			const shown = await page('/plan/timetable/series/new?/add', [...typed], head);
			expect([400, 409]).toContain(shown.status);
			expect(shown.html).toMatch(/role="alert"|aria-invalid="true"/);
			expect(shown.html).toContain('value="47"');
			expect(await counts()).toBe(before);
		}
	);

	it('answers a wrong or outdated link as if nothing were there', async () => {
		const before = await counts();
		expect((await fetch(`${server().url}/feeds/${'x'.repeat(43)}.ics`)).status).toBe(404);
		const link = '/auth/callback/email?token=outdated&email=ann%40gym.test';
		const answer = await fetch(server().url + link, { redirect: 'manual' });
		expect(answer.status).toBeLessThan(500);
		expect(answer.headers.getSetCookie().join()).not.toContain('kithour.sign-in=ey');
		expect(await counts()).toBe(before);
	});

	it('refuses ten megabytes on a page, too', async () => {
		const before = await counts();
		const body = `note=${'x'.repeat(10_000_000)}`;
		const type = 'application/x-www-form-urlencoded';
		const answer = await post(`/classes/${slotIds.open}?/book`, member, body, type);
		expect(answer.status).toBe(413);
		expect(await counts()).toBe(before);
	});
});
