import { describe, expect, it } from 'vitest';
import { anonymous, signedIn } from '../support/sign-in';
import { useServer } from '../support/use-server';

const password = 'four bells on the loft';
const filled = (code: string, over: Record<string, string> = {}) =>
	new URLSearchParams({
		code,
		'gym.name': 'Harbour Barbell',
		'gym.placeName': 'Sligo',
		'gym.zone': 'Europe/Dublin',
		'gym.currency': 'EUR',
		'gym.locale': 'en-IE',
		'gym.loadUnit': 'kg',
		'gym.weekStartsOn': '1',
		'rooms.0.name': 'Floor',
		'rooms.0.places': '16',
		'rooms.1.name': '',
		'rooms.1.places': '',
		'owner.name': 'Ada',
		'owner.email': 'ada@gym.test',
		'owner.password': password,
		...over
	});

describe('the first run, at the built server', () => {
	const server = useServer();
	const code = () => /enter the code ([\w-]+)/.exec(server().output())?.[1] ?? '';
	const post = (body: URLSearchParams, client = anonymous(server())) =>
		client('/first-run', {
			method: 'POST',
			headers: { 'content-type': 'application/x-www-form-urlencoded', accept: 'text/html' },
			body
		});

	it('is where every page leads while there is no gym, and the API says why', async () => {
		const client = anonymous(server());
		for (const page of ['/', '/sign-in', '/sign-up', '/office/people']) {
			const answer = await client(page);
			expect([page, answer.status, answer.headers.get('location')]).toEqual([
				page,
				303,
				'/first-run'
			]);
		}
		const api = await client('/api/slots');
		expect(api.status).toBe(503);
		expect(await api.json()).toMatchObject({ type: 'urn:kithour:problem:no-gym', status: 503 });
		expect((await client('/api/health')).status).toBe(200);
		expect((await client('/first-run')).status).toBe(200);
	});

	it('refuses a wrong code, a guessable password, a room twice and a zone that is none', async () => {
		expect((await post(filled('AAAA-BBBB-CCCC'))).status).toBe(409);
		const weak = await post(filled(code(), { 'owner.password': 'harbour1234' }));
		expect(await weak.text()).toContain('harder to guess');
		const twice = await post(filled(code(), { 'rooms.1.name': 'floor', 'rooms.1.places': '4' }));
		expect(await twice.text()).toContain('Two rooms cannot have one name.');
		const zone = await post(filled(code(), { 'gym.zone': 'Europe/Atlantis' }));
		expect(zone.status).toBe(400);
		expect(await zone.text()).not.toContain(password);
		expect((await anonymous(server())('/')).headers.get('location')).toBe('/first-run');
	});

	it('makes the gym, its rooms and its owner, who is signed in; the code works once', async () => {
		const owner = anonymous(server());
		const made = await post(filled(code().toLowerCase().replaceAll('-', ' ')), owner);
		expect([made.status, made.headers.get('location')]).toEqual([303, '/office/settings']);
		const settings = await (await owner('/office/settings')).text();
		expect(settings).toContain('Harbour Barbell');
		expect(await (await owner('/office/audit')).text()).toContain('Set the gym up');
		const again = await post(filled(code(), { 'owner.email': 'eve@gym.test' }));
		expect([again.status, again.headers.get('location')]).toEqual([303, '/']);
		await expect(signedIn(server(), 'eve@gym.test', password)).rejects.toThrow('not signed in');
	});
});
