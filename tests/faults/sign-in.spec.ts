import { describe, expect, it } from 'vitest';
import { useServer } from '../support/use-server';
import { addPerson, testPassword } from '../support/people';
import { signedIn } from '../support/sign-in';

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
