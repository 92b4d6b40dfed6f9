import { describe, expect, it } from 'vitest';
import { addPerson, testPassword } from '../support/people';
import { addressOf, listRoutes } from '../support/routes';
import { signedIn, type Client } from '../support/sign-in';
import { useServer } from '../support/use-server';

const origins = ['https://evil.test', 'null', null];
const types = [
	'application/x-www-form-urlencoded',
	'multipart/form-data; boundary=x',
	'text/plain',
	'application/json',
	null
];

/** Everything that changes something: our routes, and the addresses of the sign-in library. */
const unsafe: { method: string; path: string }[] = [
	...listRoutes().flatMap(({ id, methods }) =>
		methods.flatMap((name) => {
			const [method = '', action = ''] = name.split(' ');
			if (method === 'GET' || method === 'HEAD') return [];
			if (id === '/api/stripe/webhook') return [];
			const query = action && action !== '?/default' ? action : '';
			return [{ method, path: addressOf(id) + query }];
		})
	),
	...['/auth/callback/credentials', '/auth/signin/email', '/auth/signout', '/auth/session'].map(
		(path) => ({ method: 'POST', path })
	)
];

/** What was not refused with 403, of every unsafe address from every origin in every type. */
async function letThrough(client: Client, from: (string | null)[]): Promise<string[]> {
	const through: string[] = [];
	for (const { method, path } of unsafe) {
		for (const origin of from) {
			for (const type of types) {
				const answer = await client(path, {
					method,
					origin,
					headers: type ? { 'content-type': type } : {},
					body: type ? '{}' : undefined
				});
				if (answer.status !== 403) through.push(`${method} ${path} ${origin} ${type}`);
			}
		}
	}
	return through;
}

describe('requests from other sites, at the built server (goal G16)', () => {
	const server = useServer(async () => {
		await addPerson('owner@gym.test', ['owner', 'head_coach', 'front_desk', 'coach', 'member']);
	});

	it('are refused for every unsafe address, from every origin, in every type', async () => {
		const owner = await signedIn(server(), 'owner@gym.test', testPassword);
		expect(unsafe.length).toBeGreaterThan(8);
		expect(await letThrough(owner, origins)).toEqual([]);
		expect(await (await owner('/auth/session')).json()).toMatchObject({
			user: { email: 'owner@gym.test' }
		});
	});

	it('would be found out: the same requests from our own site are not all refused', async () => {
		const owner = await signedIn(server(), 'owner@gym.test', testPassword);
		expect((await letThrough(owner, [server().origin])).length).toBeGreaterThan(0);
	});
});
