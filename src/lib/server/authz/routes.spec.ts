import { describe, expect, it } from 'vitest';
import { listRoutes, type Route } from '../../../../tests/support/routes';
import { rules, type Rules } from '.';

/** Routes without a rule, and rules without a route. */
function differences(routes: Route[], table: Rules): string[] {
	const there = routes.flatMap(({ id, methods }) => methods.map((method) => `${id} ${method}`));
	const ruled = Object.entries(table).flatMap(([id, ofRoute]) =>
		Object.keys(ofRoute).map((method) => `${id} ${method}`)
	);
	return [
		...there.filter((key) => !ruled.includes(key)).map((key) => `no rule for ${key}`),
		...ruled.filter((key) => !there.includes(key)).map((key) => `no route for ${key}`)
	];
}

describe('the table of rules', () => {
	const routes = listRoutes();

	it('has a rule for every route, method and action, and none besides', () => {
		expect(routes.length).toBeGreaterThan(1);
		expect(differences(routes, rules)).toEqual([]);
	});

	/** What a change adds to what is found already. */
	const added = (changedRoutes: Route[], table: Rules) => {
		const before = differences(routes, rules);
		return differences(changedRoutes, table).filter((found) => !before.includes(found));
	};

	it('is found wanting when a route, a method or an action is added', () => {
		const page = { isPage: true, hasData: true };
		const more: Route[] = [
			...routes,
			{ ...page, id: '/(office)/office/secrets', methods: ['GET', 'POST ?/reveal'] }
		];
		expect(added(more, rules)).toEqual([
			'no rule for /(office)/office/secrets GET',
			'no rule for /(office)/office/secrets POST ?/reveal'
		]);
	});

	it('is found wanting when a rule is taken away or outlives its route', () => {
		const { '/api/health': _, ...rest } = rules;
		expect(added(routes, rest)).toEqual(['no rule for /api/health GET']);
		expect(added(routes, { ...rules, '/gone': { GET: 'anyone' } })).toEqual([
			'no route for /gone GET'
		]);
	});
});
