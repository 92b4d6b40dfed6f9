import { describe, expect, it } from 'vitest';
import { roles, type Role } from '../../src/lib/domain/people/capabilities';
import { allows, rules, type Rule } from '../../src/lib/server/authz';
import { capabilitiesOf } from '../../src/lib/domain/people/capabilities';
import { addPerson, testPassword } from '../support/people';
import { addressOf, listRoutes, type Route } from '../support/routes';
import { anonymous, signedIn, type Client } from '../support/sign-in';
import { useServer } from '../support/use-server';

type Asker = Role | 'nobody';
type Ask = { route: Route; method: string; asData: boolean };
type Verdict = 'in' | 'sign in first' | 'not allowed';

const staff: Asker[] = ['owner', 'head_coach', 'coach', 'front_desk'];
/** Who may see what, by area, written down here again and not taken from the table. */
const areas: [RegExp, Asker[]][] = [
	[/^\/\(office\)/, ['owner']],
	[/^\/\(plan\)/, ['owner', 'head_coach']],
	// A coach takes the roll of their own class from the floor.
	[/^\/\(desk\)\/desk\/\[slot=id\] POST \?\/(mark|close)$/, staff],
	[/^\/\(desk\)/, ['owner', 'head_coach', 'front_desk']],
	[/^\/\(coach\)/, staff]
];

/** Every route, method and action, and the data address of every page that loads on the server. */
const asks: Ask[] = listRoutes().flatMap((route) =>
	route.methods.flatMap((method) => [
		{ route, method, asData: false },
		...(method === 'GET' && route.hasData ? [{ route, method, asData: true }] : [])
	])
);

const nameOf = ({ route, method, asData }: Ask) =>
	`${method} ${route.id}${asData ? ' as data' : ''}`;

describe('who may use what, at the built server (goal G15)', () => {
	const server = useServer(async () => {
		for (const role of roles) await addPerson(`${role}@gym.test`, [role]);
	});

	it('is exactly what the table of rules says, for every role and for nobody', async () => {
		expect(await mismatches(server(), (ask) => ruleOf(ask))).toEqual([]);
	});

	it('keeps each area to those whose work it is', () => {
		const strangers = asks.flatMap((ask) =>
			roles.flatMap((role) => {
				const area = areas.find(([id]) => id.test(`${ask.route.id} ${ask.method}`));
				if (!area || area[1].includes(role)) return [];
				return expectedOf(ruleOf(ask), role) === 'in' ? [`${role}: ${nameOf(ask)}`] : [];
			})
		);
		expect(strangers).toEqual([]);
	});

	it('would be found out if a rule said less or more than the server does', async () => {
		const settings = asks.filter(({ route }) => route.id === '/(office)/office/settings');
		const found = (rule: Rule) => mismatches(server(), () => rule, settings);
		expect((await found('anyone')).length).toBeGreaterThan(0);
		expect((await found('bookings:write-own')).length).toBeGreaterThan(0);
	});

	it('is 405 for a method and 404 for an action that no route has', async () => {
		const owner = await signedIn(server(), 'owner@gym.test', testPassword);
		const form = { 'content-type': 'application/x-www-form-urlencoded' };
		expect((await owner('/office/people', { method: 'DELETE' })).status).toBe(405);
		for (const name of ['nothing', 'toString', 'constructor', '__proto__', 'default', '']) {
			const post = { method: 'POST', headers: form, body: 'a=1' };
			expect([name, (await owner(`/office/people?/${name}`, post)).status]).toEqual([name, 404]);
		}
	});
});

async function everybody(server: { url: string; origin: string }): Promise<[Asker, Client][]> {
	const signed = roles.map(async (role): Promise<[Asker, Client]> => [
		role,
		await signedIn(server, `${role}@gym.test`, testPassword)
	]);
	return [['nobody', anonymous(server)], ...(await Promise.all(signed))];
}

async function mismatches(
	server: { url: string; origin: string },
	ruleFor: (ask: Ask) => Rule | undefined,
	which = asks
): Promise<string[]> {
	const found: string[] = [];
	const askers = new Map(await everybody(server));
	for (const ask of which) {
		for (const [asker, client] of askers) {
			const expected = expectedOf(ruleFor(ask), asker);
			const seen = await verdictOf(client, ask);
			if (seen !== expected) found.push(`${asker}: ${nameOf(ask)}: ${seen}, not ${expected}`);
			if (asker !== 'nobody' && ask.method !== 'GET' && !(await isSignedIn(client))) {
				askers.set(asker, await signedIn(server, `${asker}@gym.test`, testPassword));
			}
		}
	}
	return found;
}

/** Signing out, and out everywhere, are among what is asked. */
const isSignedIn = async (client: Client) =>
	(await (await client('/auth/session')).json()) !== null;

const ruleOf = ({ route, method }: Ask): Rule | undefined => rules[route.id]?.[method];

function expectedOf(rule: Rule | undefined, asker: Asker): Verdict {
	if (rule === undefined) return 'not allowed';
	const viewer =
		asker === 'nobody' ? null : { capabilities: capabilitiesOf([asker]), roles: [asker] };
	if (allows(rule, viewer as Parameters<typeof allows>[1])) return 'in';
	return viewer ? 'not allowed' : 'sign in first';
}

async function verdictOf(client: Client, ask: Ask): Promise<Verdict> {
	const answer = await client(pathOf(ask), initOf(ask));
	if (answer.status === 401) return 'sign in first';
	if (answer.status === 403) return 'not allowed';
	const location = answer.headers.get('location') ?? (await locationInside(answer));
	return location?.startsWith('/sign-in?to=') ? 'sign in first' : 'in';
}

/** Data requests and form actions that a script sends are led away inside a JSON body. */
async function locationInside(answer: Response): Promise<string | undefined> {
	if (!answer.headers.get('content-type')?.startsWith('application/json')) return undefined;
	const body = (await answer.json()) as { location?: string } | null;
	return body?.location;
}

function pathOf({ route, method, asData }: Ask): string {
	const address = addressOf(route.id);
	if (asData) return `${address === '/' ? '' : address}/__data.json`;
	const action = /^POST \?(\/.+)$/.exec(method)?.[1];
	return action && action !== '/default' ? `${address}?${action}` : address;
}

function initOf({ route, method }: Ask): RequestInit {
	const [verb = 'GET'] = method.split(' ');
	if (verb === 'GET' || verb === 'HEAD') return {};
	return route.isPage
		? {
				method: verb,
				headers: { 'content-type': 'application/x-www-form-urlencoded' },
				body: 'nothing=here'
			}
		: { method: verb, headers: { 'content-type': 'application/json' }, body: '{}' };
}
