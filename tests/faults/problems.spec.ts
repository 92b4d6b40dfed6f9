import { describe, expect, it } from 'vitest';
import { addPerson, testPassword } from '../support/people';
import { anonymous, signedIn } from '../support/sign-in';
import { useServer } from '../support/use-server';

describe('errors of the API, at the built server', () => {
	const server = useServer(async () => {
		await addPerson('member@gym.test', ['member']);
	});

	const json = { 'content-type': 'application/json' };
	const form = { 'content-type': 'application/x-www-form-urlencoded' };
	const html = { accept: 'text/html' };
	const evil = 'https://evil.test';

	it.each([
		['no such address', 404, '/api/nothing', { headers: html }],
		['no such slot', 404, '/api/slots/999999', { headers: html }],
		['an id that is none', 404, '/api/slots/none', {}],
		['a method that is not there', 405, '/api/slots', { method: 'DELETE' }],
		['a method that nobody knows', 405, '/api/slots', { method: 'PROPFIND' }],
		['nobody signed in', 401, '/api/me/bookings', { headers: html }],
		['another site', 403, '/api/slots/1/bookings', { method: 'POST', headers: json, origin: evil }],
		[
			'a form of another site',
			403,
			'/api/slots/1/bookings',
			{ method: 'POST', headers: form, origin: evil }
		],
		[
			'a form without an origin',
			403,
			'/api/slots/1/bookings',
			{ method: 'POST', headers: form, origin: null }
		],
		['a range that is none', 400, '/api/slots?from=2026-02-30&to=x', {}],
		['an address that cannot be decoded', 400, '/api/%', {}]
	])('say %s in a problem document', async (_, status, path, init) => {
		const answer = await anonymous(server())(path, init);
		expect(answer.status).toBe(status);
		await expectProblem(answer);
	});

	it.each([
		['a missing capability', 403, '/api/slots/1/roll', 'GET', '{}', json],
		['no JSON', 400, '/api/slots/1/bookings', 'POST', '{"a":', json],
		['a form', 415, '/api/slots/1/bookings', 'POST', 'a=1', form],
		['no type', 415, '/api/slots/1/bookings', 'POST', undefined, {}],
		['deep nesting', 400, '/api/slots/1/bookings', 'POST', '['.repeat(400) + ']'.repeat(400), json],
		['ten megabytes', 413, '/api/slots/1/bookings', 'POST', JSON.stringify('x'.repeat(1e7)), json]
	])(
		'say %s to a member in a problem document',
		async (what, status, path, method, body, headers) => {
			const member = await signedIn(server(), 'member@gym.test', testPassword);
			const answer = await member(path, { method, headers, ...(method === 'GET' ? {} : { body }) });
			expect([404, status]).toContain(answer.status);
			if (what !== 'a missing capability') expect(answer.status).toBe(status);
			await expectProblem(answer);
		}
	);
});

/** RFC 9457, section 3: type, title, status and detail, as application/problem+json. */
async function expectProblem(answer: Response): Promise<void> {
	expect(answer.headers.get('content-type')).toMatch(/^application\/problem\+json/);
	const body = (await answer.json()) as Record<string, unknown>;
	expect(body).toMatchObject({
		type: expect.stringMatching(/^urn:kithour:problem:[a-z-]+$/),
		title: expect.stringMatching(/\S/),
		status: answer.status,
		detail: expect.stringMatching(/\S/)
	});
	expect(JSON.stringify(body)).not.toMatch(/\bat .*\(|node_modules|<html/i);
}
