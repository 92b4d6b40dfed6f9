import { createServer } from 'node:http';
import fc from 'fast-check';
import { afterAll, describe, expect, it } from 'vitest';
import { z } from 'zod';
import { hostileBody, hostileWord, type HostileBody } from '../support/hostile';
import { seededDatabase } from '../support/seeded-database';
import { addPerson, testPassword } from '../support/people';
import { addressOf, listRoutes } from '../support/routes';
import { anonymous, signedIn, type Client } from '../support/sign-in';
import { useServer } from '../support/use-server';

/** FUZZ=10000 is the whole of goal G14; every run of the tests does a part. */
const count = Number(process.env.FUZZ ?? 1500);
const fixedSeed = 20_261_201;
const freshSeed = Math.floor(Math.random() * 2 ** 31);

/** Every schema that reads what a browser or a machine sends. */
const modules = import.meta.glob<Record<string, unknown>>(
	['../../src/lib/forms/*.ts', '../../src/lib/server/api/**/*.ts', '!**/*.spec.ts'],
	{ eager: true }
);
const schemas = Object.values(modules)
	.flatMap((module) => Object.values(module))
	.filter((value): value is z.ZodType => value instanceof z.ZodType);

/** One instant a day, so that the seeded database is made once. */
const startOfToday = Math.floor(Date.now() / 86_400_000) * 86_400_000;

const oddActions = ['constructor', 'toString', '__proto__', 'hasOwnProperty', 'default', 'x'];

type Attack = { method: string; path: string; sent: HostileBody; query: string };

const targets = [
	...listRoutes().flatMap(({ id, methods }) =>
		methods.map((name) => ({ id, method: name.split(' ')[0] ?? 'GET', action: name.split('?')[1] }))
	),
	...['callback/credentials', 'signin/email', 'session', 'csrf', 'signin', 'error'].map((path) => ({
		id: `/auth/${path}`,
		method: path.includes('/') ? 'POST' : 'GET',
		action: undefined
	}))
].filter(({ id, method, action }) => method === 'GET' || !/sign-out|everywhere/.test(id + action));

const attack: fc.Arbitrary<Attack> = fc
	.record({
		target: fc.constantFrom(...targets),
		sent: hostileBody(schemas),
		odd: fc.oneof({ weight: 9, arbitrary: fc.constant(null) }, fc.constantFrom(...oddActions)),
		blank: fc.oneof(fc.constant(null), fc.integer({ min: 1, max: 900 }).map(String), hostileWord),
		query: fc.option(
			fc.tuple(fc.constantFrom('to', 'from', 'before', 'code', 'email'), hostileWord)
		)
	})
	.map(({ target, sent, odd, blank, query }) => {
		const address = addressOf(target.id);
		const path = blank === null ? address : withBlank(target.id, blank);
		const action = odd !== null && target.method === 'POST' ? `/${odd}` : target.action;
		const named = action && action !== '/default' ? action : '';
		const asked = query ? new URLSearchParams([[query[0], safe(query[1])]]).toString() : '';
		return { method: target.method, path, sent, query: [named, asked].filter(Boolean).join('&') };
	});

/** The route's address with something hostile where an id or a token belongs. */
const withBlank = (id: string, blank: string) =>
	addressOf(id.replace(/\[[^\]]+\]/g, () => encodeURIComponent(safe(blank).slice(0, 300)) || '0'));

const safe = (text: string) => text.replace(/[\ud800-\udfff]/g, '?');

async function send(client: Client, { method, path, sent, query }: Attack): Promise<number> {
	const hasBody = !['GET', 'HEAD'].includes(method);
	const answer = await client(query ? `${path}?${query}` : path, {
		method,
		...(hasBody ? { body: sent.body } : {}),
		headers: hasBody && sent.type ? { 'content-type': sent.type } : {}
	});
	await answer.arrayBuffer();
	return answer.status;
}

/** Sends `attacks`, eight at a time; returns how often each status came and what broke. */
async function bombard(clients: Client[], attacks: Attack[]) {
	const statuses = new Map<number, number>();
	const broken: string[] = [];
	const queue = attacks.entries();
	const worker = async () => {
		for (const [i, one] of queue) {
			const client = clients[i % clients.length];
			if (!client) throw new Error('no client');
			const status = await send(client, one).catch((e: Error) => {
				broken.push(String(e.cause));
				return 599;
			});
			statuses.set(status, (statuses.get(status) ?? 0) + 1);
			if (status >= 500) broken.push(`${status} ${one.method} ${one.path}?${one.query}`);
		}
	};
	await Promise.all(Array.from({ length: 8 }, worker));
	return { statuses, broken };
}

describe(`hostile requests, ${count} of them (goal G14)`, () => {
	const server = useServer(
		async () => {
			await addPerson('all@gym.test', ['owner', 'head_coach', 'coach', 'front_desk', 'member']);
		},
		{},
		() => seededDatabase(startOfToday)
	);

	it('take the shape of our own schemas', () => {
		expect(schemas.length).toBeGreaterThan(20);
	});

	it(`are refused and never crash anything; fresh seed ${freshSeed}`, async () => {
		const all = await signedIn(server(), 'all@gym.test', testPassword);
		const clients = [
			anonymous(server()),
			all,
			await signedIn(server(), 'member@ropewalk.example', 'ropewalk-demo')
		];
		const half = Math.ceil(count / 2);
		const attacks = [
			...fc.sample(attack, { numRuns: half, seed: fixedSeed }),
			...fc.sample(attack, { numRuns: half, seed: freshSeed })
		];
		const { statuses, broken } = await bombard(clients, attacks);
		expect(broken).toEqual([]);
		expect(server().output()).not.toContain('"msg":"fault"');
		expect((await fetch(`${server().url}/api/health`)).status).toBe(200);
		expect(await (await all('/auth/session')).json()).not.toBeNull();
		for (const reached of [200, 303, 400, 404, 415]) {
			expect([reached, statuses.get(reached) ?? 0]).toEqual([reached, expect.any(Number)]);
			expect(statuses.get(reached) ?? 0).toBeGreaterThan(0);
		}
	}, 300_000);

	it('answers 413 to ten megabytes, on a page and in the API, with and without a stated length', async () => {
		const client = await signedIn(server(), 'all@gym.test', testPassword);
		const large = 'a='.padEnd(10 * 1024 * 1024, 'x');
		const form = { 'content-type': 'application/x-www-form-urlencoded' };
		const whole = { method: 'POST', headers: form, body: large };
		expect((await client('/office/people?/invite', whole)).status).toBe(413);
		const chunked = {
			method: 'POST',
			headers: form,
			body: new Blob([large]).stream(),
			duplex: 'half'
		} as RequestInit;
		const status = await client('/office/people?/invite', chunked).then(
			(a) => a.status,
			() => 413
		);
		expect(status).toBe(413);
	});
});

describe('the same requests at a server that trusts what it is sent', () => {
	const trusting = createServer((request, response) => {
		let body = '';
		request.on('data', (chunk: Buffer) => (body += chunk.toString()));
		request.on('end', () => {
			try {
				const value = JSON.parse(body || '{}') as { name?: { length: number } } | null;
				response.end(String(value?.name?.length));
			} catch {
				response.writeHead(500).end();
			}
		});
	});
	afterAll(() => void trusting.close());

	it('break it: the goal would notice', async () => {
		await new Promise<void>((up) => trusting.listen(0, '127.0.0.1', up));
		const { port } = trusting.address() as { port: number };
		const url = `http://127.0.0.1:${port}`;
		const attacks = fc.sample(attack, { numRuns: 300, seed: fixedSeed });
		const { broken } = await bombard([anonymous({ url, origin: url })], attacks);
		expect(broken.length).toBeGreaterThan(0);
	});
});
