import { asc, like } from 'drizzle-orm';
import Stripe from 'stripe';
import { beforeAll, describe, expect, it } from 'vitest';
import { z } from 'zod';
import { addDays } from '../../src/lib/domain/calendar/civil-date';
import * as shapes from '../../src/lib/server/api/shapes';
import { db } from '../../src/lib/server/db';
import { people } from '../../src/lib/server/db/schema';
import { mintSignIns } from '../support/mint';
import { listRoutes } from '../support/routes';
import { seededDatabase } from '../support/seeded-database';
import { anonymous } from '../support/sign-in';
import { useServer } from '../support/use-server';

type Answer = { $ref?: string; content?: Record<string, { schema: object }> };
type OpenApi = {
	openapi: string;
	paths: Record<string, Record<string, { responses: Record<string, Answer> }>>;
	components: { responses: Record<string, Answer> };
};
type Asked = { id?: number; query?: string; body?: object; headers?: Record<string, string> };
type Slot = z.infer<typeof shapes.slotShape>;
type Roll = z.infer<typeof shapes.rollShape>;

const secret = 'whsec_only_for_tests';
/** One instant a day, so that the seeded database is made once. */
const startOfToday = Math.floor(Date.now() / 86_400_000) * 86_400_000;
const today = new Date(startOfToday).toISOString().slice(0, 10);
const during = (from: number, to: number) =>
	`?from=${addDays(today, from)}&to=${addDays(today, to)}`;

const answers: Record<string, z.ZodType> = {
	'GET /api/slots': shapes.slotsShape,
	'GET /api/slots/{id}': shapes.oneSlotShape,
	'GET /api/slots/{id}/kit': shapes.kitShape,
	'GET /api/slots/{id}/roll': shapes.rollShape,
	'PATCH /api/slots/{id}/roll': shapes.rollShape,
	'POST /api/slots/{id}/bookings': shapes.bookedShape,
	'DELETE /api/bookings/{id}': shapes.cancelledShape,
	'GET /api/me/bookings': shapes.myBookingsShape,
	'POST /api/stripe/webhook': shapes.receivedShape
};

/** Where a body leaves its schema: what is missing or odd, and what the schema never names. */
function faultsOf(schema: z.ZodType, body: unknown): string[] {
	const read = schema.safeParse(body);
	if (!read.success) return read.error.issues.map((i) => `${i.path.join('.')}: ${i.message}`);
	const [named, said] = [inOrder(read.data), inOrder(body)];
	return named === said ? [] : [`says more than its schema names: ${said}`];
}

/** JSON with the fields of every object in order of name: a schema has an order of its own. */
const inOrder = (value: unknown): string =>
	JSON.stringify(value, (_, inner: unknown) =>
		inner !== null && typeof inner === 'object' && !Array.isArray(inner)
			? Object.fromEntries(Object.entries(inner).sort(([a], [b]) => (a < b ? -1 : 1)))
			: inner
	);

/** The schema that a published document has for an answer; null where it has none. */
function published(openApi: OpenApi, name: string, status: number): z.ZodType | null {
	const [method = '', path = ''] = name.split(' ');
	const { responses } = openApi.paths[path]?.[method.toLowerCase()] ?? { responses: {} };
	const said = responses[status] ?? responses.default;
	const shared = said?.$ref?.split('/').at(-1);
	const [content] = Object.values(
		(shared ? openApi.components.responses[shared] : said)?.content ?? {}
	);
	if (!content) return null;
	return z.fromJSONSchema(content.schema as Parameters<typeof z.fromJSONSchema>[0]);
}

const described = ({ paths }: Pick<OpenApi, 'paths'>) =>
	Object.entries(paths)
		.flatMap(([path, methods]) => Object.keys(methods).map((m) => `${m.toUpperCase()} ${path}`))
		.sort();

/** What machines may ask, from the files themselves: "GET /api/slots/{id}". */
const served = listRoutes()
	.filter(({ id }) => /^\/(api|feeds)\//.test(id))
	.flatMap(({ id, methods }) =>
		methods.map((method) => `${method} ${id.replaceAll(/\[(\w+)(=\w+)?\]/g, '{$1}')}`)
	)
	.sort();

describe('what the API answers about the demo gym', () => {
	/** By the left side of the address: "member", "desk", "member001". */
	const cookies = new Map<string, string>();
	const server = useServer(
		async () => {
			const everybody = await db
				.select({ id: people.id, email: people.email })
				.from(people)
				.where(like(people.email, '%@ropewalk.example'))
				.orderBy(asc(people.id));
			const minted = await mintSignIns(everybody.map(({ id }) => id));
			for (const [i, { email }] of everybody.entries()) {
				cookies.set(email!.split('@')[0]!, minted[i]!);
			}
		},
		{ STRIPE_WEBHOOK_SECRET: secret },
		() => seededDatabase(startOfToday)
	);
	const members = () => [...cookies.keys()].filter((name) => /^member\d/.test(name));

	let openApi: OpenApi;
	beforeAll(async () => {
		openApi = (await (await fetch(`${server().url}/api/openapi.json`)).json()) as OpenApi;
	});

	/** Asks, and holds the answer to its schema twice: the source's and the published document's. */
	async function ask<Body>(
		who: string | null,
		name: string,
		{ id = 0, query = '', body, headers = {} }: Asked = {}
	): Promise<{ status: number; body: Body }> {
		const [method, template = ''] = name.split(' ');
		const path = template.replace('{id}', String(id)) + query;
		const answer = await anonymous(server())(path, {
			method,
			headers: {
				...(who === null ? {} : { cookie: cookies.get(who)! }),
				...(body ? { 'content-type': 'application/json' } : {}),
				...headers
			},
			...(body ? { body: JSON.stringify(body) } : {})
		});
		const said: unknown = await answer.json();
		const own = answer.ok ? answers[name] : shapes.problemShape;
		const documented = published(openApi, name, answer.status);
		const faults = [own, documented].flatMap((schema) => (schema ? faultsOf(schema, said) : []));
		expect([method, path, answer.status, documented && faults]).toEqual([
			method,
			path,
			answer.status,
			[]
		]);
		expect(answer.headers.get('content-type')).toMatch(
			answer.ok ? /^application\/json/ : /^application\/problem\+json/
		);
		return { status: answer.status, body: said as Body };
	}

	const slotsFrom = async (from: number, to: number, who: string | null = null) =>
		(await ask<{ slots: Slot[] }>(who, 'GET /api/slots', { query: during(from, to) })).body.slots;

	it('is described, every address and method of it, and nothing else is', () => {
		expect(openApi.openapi).toBe('3.1.0');
		expect(described(openApi)).toEqual(served);
		expect(served).toContain('PATCH /api/slots/{id}/roll');
	});

	it('keeps to its schemas: health, and classes in order of start, each with its offset', async () => {
		expect((await ask(null, 'GET /api/health')).body).toEqual({ status: 'ok' });
		for (const who of [null, 'member', 'owner']) {
			const slots = await slotsFrom(-30, 40, who);
			expect(slots.length).toBeGreaterThan(100);
			const starts = slots.map(({ startsAt }) => Date.parse(startsAt));
			expect(starts).toEqual([...starts].sort((a, b) => a - b));
			for (const { startsAt, endsAt } of slots) {
				expect(startsAt).toMatch(/[+-]\d\d:\d\d$/);
				expect(Date.parse(endsAt)).toBeGreaterThan(Date.parse(startsAt));
			}
		}
	});

	it('keeps to its schemas: each class, its kit and its roll, for everybody who may ask', async () => {
		const seen = new Set<string>();
		for (const { id } of await slotsFrom(-2, 3)) {
			const one = await ask<z.infer<typeof shapes.oneSlotShape>>(null, 'GET /api/slots/{id}', {
				id
			});
			const own = await ask<Slot>('member', 'GET /api/slots/{id}', { id });
			const limits = await ask<object>('member', 'GET /api/slots/{id}/kit', { id });
			const kit = await ask<z.infer<typeof shapes.kitShape>>('head', 'GET /api/slots/{id}/kit', {
				id
			});
			const roll = await ask<Roll>('desk', 'GET /api/slots/{id}/roll', { id });
			const coached = await ask<Roll>('coach', 'GET /api/slots/{id}/roll', { id });
			expect([one.status, own.status, kit.status, roll.status]).toEqual([200, 200, 200, 200]);
			expect(Object.keys(limits.body).sort()).toEqual(['limit', 'limitedBy']);
			if (one.body.session) seen.add('a published session');
			if (own.body.myBooking) seen.add('my booking');
			if (kit.body.lanes?.some(({ claims }) => claims.length > 0)) seen.add('claims on kit');
			if (roll.body.roll.some(({ at }) => at)) seen.add('somebody who came');
			seen.add(`a coach is told ${coached.status}`);
		}
		expect([...seen].sort()).toEqual([
			'a coach is told 200',
			'a coach is told 404',
			'a published session',
			'claims on kit',
			'my booking',
			'somebody who came'
		]);
	});

	it('keeps to its schemas: own bookings with their classes', async () => {
		let count = 0;
		for (const who of members().slice(0, 8)) {
			const query = during(-40, 40);
			const own = await ask<z.infer<typeof shapes.myBookingsShape>>(who, 'GET /api/me/bookings', {
				query
			});
			count += own.body.bookings.length;
		}
		expect(count).toBeGreaterThan(8);
	});

	it('keeps to its schemas: booking, waiting and giving up, the same answer to the same key', async () => {
		const open = (await slotsFrom(1, 4)).filter(({ status }) => status === 'scheduled');
		const [fullest] = open.sort((a, b) => a.places.free - b.places.free);
		const kept: { who: string; id: number }[] = [];
		const told = new Set<string>();
		for (const who of members().slice(0, 60)) {
			const asked = { id: fullest!.id, body: {}, headers: { 'idempotency-key': `rush-${who}` } };
			const name = 'POST /api/slots/{id}/bookings';
			const first = await ask<z.infer<typeof shapes.bookedShape>>(who, name, asked);
			expect(await ask(who, name, asked)).toEqual(first);
			told.add([first.status, first.body.booking?.status].join(' ').trim());
			if (first.status === 201) kept.push({ who, id: first.body.booking.id });
		}
		expect([...told]).toContain('201 waitlisted');
		const again = { id: fullest!.id, body: {} };
		const { status } = await ask(kept[0]!.who, 'POST /api/slots/{id}/bookings', again);
		expect(status).toBe(409);
		for (const { who, id } of kept) {
			const gone = await ask<object>(who, 'DELETE /api/bookings/{id}', { id });
			expect(gone).toMatchObject({ status: 200, body: { booking: { id } } });
			expect((await ask(who, 'DELETE /api/bookings/{id}', { id })).status).toBe(409);
		}
	});

	it('keeps to its schemas: a roll that is marked and marked back', async () => {
		let rolls = 0;
		for (const { id } of await slotsFrom(-3, -1)) {
			const { body } = await ask<Roll>('desk', 'GET /api/slots/{id}/roll', { id });
			const came = body.roll.find(({ status }) => status === 'attended');
			if (!came) continue;
			rolls += 1;
			for (const status of ['no-show', 'booked', 'attended'] as const) {
				const marks = [{ bookingId: came.bookingId, status, late: status === 'attended' }];
				const name = 'PATCH /api/slots/{id}/roll';
				const marked = await ask<Roll>('desk', name, { id, body: { marks } });
				const row = marked.body.roll.find(({ bookingId }) => bookingId === came.bookingId);
				expect([row?.status, row?.late]).toEqual([status, status === 'attended']);
			}
		}
		expect(rolls).toBeGreaterThan(0);
	});

	it('keeps to its schemas: what the payment service is told', async () => {
		const body = { id: 'evt_shape', object: 'event', type: 'invoice.paid', created: 1 };
		const payload = JSON.stringify(body);
		const signature = Stripe.webhooks.generateTestHeaderString({ payload, secret });
		const headers = { 'stripe-signature': signature };
		const told = await ask(null, 'POST /api/stripe/webhook', { body, headers });
		expect(told).toEqual({ status: 200, body: { received: true } });
		expect((await ask(null, 'POST /api/stripe/webhook', { body })).status).toBe(400);
	});

	it.each<[number, string | null, string, Asked]>([
		[400, null, 'GET /api/slots', { query: '?from=2026-02-30&to=x' }],
		[400, 'member', 'POST /api/slots/{id}/bookings', { id: 1, body: { loads: { a: -1 } } }],
		[400, 'desk', 'PATCH /api/slots/{id}/roll', { id: 1, body: { marks: [] } }],
		[401, null, 'GET /api/me/bookings', { query: during(0, 1) }],
		[401, null, 'POST /api/slots/{id}/bookings', { id: 1, body: {} }],
		[403, 'member', 'GET /api/slots/{id}/roll', { id: 1 }],
		[404, null, 'GET /api/slots/{id}', { id: 999_999 }],
		[404, 'member', 'GET /api/slots/{id}/kit', { id: 999_999 }],
		[404, 'member', 'DELETE /api/bookings/{id}', { id: 999_999 }]
	])('keeps to the schema of problems: %i for %s at %s', async (status, who, name, asked) => {
		expect((await ask(who, name, asked)).status).toBe(status);
	});

	it('would be found out: a field too few, too many or of another kind, an address left out', async () => {
		const [slot] = await slotsFrom(0, 7);
		const { title: _title, ...untitled } = slot!;
		const documented = published(openApi, 'GET /api/slots', 200)!;
		for (const broken of [
			untitled,
			{ ...slot, colour: 'red' },
			{ ...slot, startsAt: Date.parse(slot!.startsAt) },
			{ ...slot, status: 'moved' },
			{ ...slot, room: { ...slot!.room, places: 18 } }
		]) {
			expect(faultsOf(shapes.slotShape, broken)).not.toEqual([]);
			expect(faultsOf(documented, { slots: [broken] })).not.toEqual([]);
		}
		const { '/api/slots': _slots, ...paths } = openApi.paths;
		expect(described({ paths })).not.toEqual(served);
	});
});
