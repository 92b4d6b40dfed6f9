import { describe, expect, it } from 'vitest';
import { useServer } from '../support/use-server';
import { addPerson, testPassword } from '../support/people';
import { anonymous, signedIn, type Client } from '../support/sign-in';

describe('signing in at the built server', () => {
	const server = useServer(async () => {
		await addPerson('owner@gym.test', ['owner']);
		await addPerson('member@gym.test', ['member']);
	});

	it('answers health', async () => {
		const answer = await fetch(`${server().url}/api/health`);
		expect([answer.status, await answer.json()]).toEqual([200, { status: 'ok' }]);
	});

	it('signs in by password and says who it is', async () => {
		const member = await signedIn(server(), 'member@gym.test', testPassword);
		const session = await (await member('/auth/session')).json();
		expect(session).toMatchObject({ user: { email: 'member@gym.test', name: 'member' } });
	});

	it('refuses a wrong password and stays signed out', async () => {
		await expect(signedIn(server(), 'member@gym.test', 'wrong')).rejects.toThrow('not signed in');
	});

	it('ends a sign-in at sign-out: the old cookie is nobody', async () => {
		const member = await signedIn(server(), 'member@gym.test', testPassword);
		const out = await member('/auth/signout', {
			method: 'POST',
			headers: { 'content-type': 'application/x-www-form-urlencoded' }
		});
		expect(out.status).toBe(302);
		expect(await (await member('/auth/session')).json()).toBeNull();
	});
});

describe('signing in by a mailed link', () => {
	const server = useServer(async () => {
		await addPerson('member@gym.test', ['member']);
	});
	const form = { 'content-type': 'application/x-www-form-urlencoded', accept: 'text/html' };
	const ask = (email: string, to = '/classes') =>
		anonymous(server())(`/sign-in?/link&to=${encodeURIComponent(to)}`, {
			method: 'POST',
			headers: form,
			body: new URLSearchParams({ email })
		});
	const mailed = async (email: string): Promise<URL> => {
		for (let tries = 0; tries < 50; tries += 1) {
			const answer = await fetch(`${server().mailUrl}/api/mails?to=${email}`);
			const { mails } = (await answer.json()) as { mails: { text: string }[] };
			const link = /https?:\/\/\S+\/sign-in\/link\?\S+/.exec(mails[0]?.text ?? '')?.[0];
			if (link) return new URL(link);
			await new Promise((later) => setTimeout(later, 100));
		}
		throw new Error('no mail came');
	};
	const follow = (link: URL, client = anonymous(server())) =>
		client(link.pathname + link.search, {
			method: 'POST',
			headers: form,
			body: new URLSearchParams({
				email: link.searchParams.get('email') ?? '',
				token: link.searchParams.get('token') ?? ''
			})
		});

	it('works once, leads back to where it was asked for, and reading the page does not spend it', async () => {
		expect((await ask('Member@Gym.test', '/classes/7')).status).toBe(200);
		const link = await mailed('member@gym.test');
		expect(link.origin).toBe(server().origin);
		expect((await anonymous(server())(link.pathname + link.search)).status).toBe(200);

		const member = anonymous(server());
		const entered = await follow(link, member);
		expect([entered.status, entered.headers.get('location')]).toEqual([303, '/classes/7']);
		expect(await (await member('/auth/session')).json()).toMatchObject({
			user: { email: 'member@gym.test' }
		});

		const again = await follow(link);
		expect(again.status).toBe(409);
		expect(await again.text()).toContain('used already or is older than 20 minutes');
	});

	it('says the same to an address without an account, and mails nobody', async () => {
		const known = await (await ask('member@gym.test')).text();
		const unknown = await (await ask('nobody@gym.test')).text();
		const plain = (html: string) => html.replace(/nonce="[^"]*"|\S+@gym\.test/g, '');
		expect(plain(unknown).length).toBe(plain(known).length);
		await new Promise((later) => setTimeout(later, 1500));
		const answer = await fetch(`${server().mailUrl}/api/mails?to=nobody@gym.test`);
		expect(await answer.json()).toEqual({ mails: [] });
	});

	it('is mailed five times a quarter of an hour at most', async () => {
		const statuses = [];
		for (let i = 0; i < 7; i += 1) statuses.push((await ask('bombed@gym.test')).status);
		expect(statuses).toEqual([200, 200, 200, 200, 200, 429, 429]);
	});

	it('never leads to another site', async () => {
		for (const to of ['//evil.test', '/\\evil.test', 'https://evil.test', '/%5cevil.test']) {
			const answer = await anonymous(server())(`/sign-in?/password&to=${encodeURIComponent(to)}`, {
				method: 'POST',
				headers: form,
				body: new URLSearchParams({ email: 'member@gym.test', password: testPassword })
			});
			expect([answer.status, answer.headers.get('location')]).toEqual([303, '/classes']);
		}
		const direct = await anonymous(server())('/auth/callback/credentials', {
			method: 'POST',
			headers: form,
			body: new URLSearchParams({
				email: 'member@gym.test',
				password: testPassword,
				callbackUrl: 'https://evil.test/'
			})
		});
		expect(new URL(direct.headers.get('location') ?? '').origin).toBe(server().origin);
	});
});

describe('what ends a sign-in', () => {
	const server = useServer(async () => {
		await addPerson('owner@gym.test', ['owner']);
		await addPerson('coach@gym.test', ['coach']);
	});
	const isSignedIn = async (client: Client) =>
		(await (await client('/auth/session')).json()) !== null;
	const staff = (owner: Client, action: string, fields: Record<string, string>) =>
		owner(`/office/people?/${action}`, {
			method: 'POST',
			headers: { 'content-type': 'application/x-www-form-urlencoded' },
			body: new URLSearchParams(fields)
		});

	it('is a role granted or taken, an account shut: at the next request', async () => {
		const owner = await signedIn(server(), 'owner@gym.test', testPassword);
		for (const [action, fields] of [
			['grant', { personId: '2', role: 'front_desk' }],
			['revoke', { personId: '2', role: 'front_desk' }],
			['shut', { personId: '2' }]
		] as const) {
			const coach = await signedIn(server(), 'coach@gym.test', testPassword);
			expect(await isSignedIn(coach)).toBe(true);
			expect((await staff(owner, action, { ...fields })).status).toBe(200);
			expect([action, await isSignedIn(coach)]).toEqual([action, false]);
		}
		await expect(signedIn(server(), 'coach@gym.test', testPassword)).rejects.toThrow(
			'not signed in'
		);
		expect(await isSignedIn(owner)).toBe(true);
	});

	it('is a forged, a foreign and a cut cookie, without a fault', async () => {
		for (const cookie of ['nonsense', 'a.b.c.d.e', 'x'.repeat(3000), '%00', '{}']) {
			const answer = await fetch(`${server().url}/auth/session`, {
				headers: { cookie: `kithour.sign-in=${cookie}` }
			});
			expect([answer.status, await answer.json()]).toEqual([200, null]);
		}
		expect(server().output()).not.toContain('"msg":"fault"');
	});
});
