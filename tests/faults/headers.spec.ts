import { describe, expect, it } from 'vitest';
import { addPerson, testPassword } from '../support/people';
import { anonymous, signedIn } from '../support/sign-in';
import { useServer } from '../support/use-server';

/**
 * The score of Mozilla's HTTP Observatory, 2016 revision, from memory: 100, less faults, plus
 * bonuses when the rest is 90 or more.
 */
function score(headers: Headers, cookies: string[]): number {
	const policy = headers.get('content-security-policy') ?? '';
	const directive = (name: string) => new RegExp(`(?:^|;)\\s*${name} ([^;]*)`).exec(policy)?.[1];
	const scripts = directive('script-src') ?? directive('default-src') ?? '';
	let points = 100;
	if (policy === '') points -= 25;
	else if (/'unsafe-inline'|data:|\*/.test(scripts)) points -= 20;
	if (!/max-age=(?:1[5-9]\d{6}|[2-9]\d{7,})/.test(headers.get('strict-transport-security') ?? '')) {
		points -= 20;
	}
	if (headers.get('x-content-type-options') !== 'nosniff') points -= 5;
	if (!headers.has('x-frame-options') && !directive('frame-ancestors')) points -= 20;
	for (const cookie of cookies) {
		if (!/;\s*secure/i.test(cookie)) points -= 40;
		if (!/;\s*httponly/i.test(cookie)) points -= 30;
	}
	if (points < 90) return points;
	if (directive('default-src') === "'none'" && !policy.includes('unsafe')) points += 10;
	if (cookies.length > 0 && cookies.every((c) => /;\s*samesite=(?:lax|strict)/i.test(c)))
		points += 5;
	if (directive('frame-ancestors') === "'none'") points += 5;
	if (/^(?:no-referrer|same-origin|strict-origin)/.test(headers.get('referrer-policy') ?? '')) {
		points += 5;
	}
	return points;
}

describe('headers at the built server (goal G25)', () => {
	const server = useServer(
		async () => {
			await addPerson('member@gym.test', ['member']);
		},
		{ ORIGIN: 'https://gym.test' }
	);

	it.each([
		['a page', '/sign-in', 200],
		['a page that is not there', '/nothing-here', 404],
		['the API', '/api/health', 200],
		['an API error', '/api/nothing-here', 404],
		['a redirect to the sign-in page', '/office/people', 303],
		['an address that cannot be decoded', '/%', 400],
		['the sign-in library', '/auth/session', 200]
	])('are whole on %s', async (_, path, status) => {
		const answer = await anonymous(server())(path);
		expect(answer.status).toBe(status);
		expect(score(answer.headers, [])).toBeGreaterThanOrEqual(110);
	});

	it('are whole on the framework’s own refusals and on files', async () => {
		const evil = { method: 'POST', origin: 'https://evil.test' };
		const form = { 'content-type': 'application/x-www-form-urlencoded' };
		const refused = await anonymous(server())('/sign-in', { ...evil, headers: form, body: 'a=1' });
		expect(refused.status).toBe(403);
		expect(score(refused.headers, [])).toBeGreaterThanOrEqual(110);

		const page = await (await anonymous(server())('/sign-in')).text();
		const script = /["'(](?:\.)?(\/_app\/immutable\/[^"')]+\.js)/.exec(page)?.[1] ?? 'no script';
		const file = await anonymous(server())(script);
		expect(file.status).toBe(200);
		expect(score(file.headers, [])).toBeGreaterThanOrEqual(110);
	});

	it('score 110 or more when somebody signs in, cookies and all', async () => {
		const answer = await anonymous(server())('/auth/callback/credentials', {
			method: 'POST',
			headers: { 'content-type': 'application/x-www-form-urlencoded' },
			body: new URLSearchParams({ email: 'member@gym.test', password: testPassword })
		});
		const cookies = answer.headers.getSetCookie();
		expect(cookies.some((c) => c.startsWith('__Host-kithour.sign-in='))).toBe(true);
		expect(score(answer.headers, cookies)).toBeGreaterThanOrEqual(110);
	});

	it('keep private pages out of caches', async () => {
		const member = await signedIn(server(), 'member@gym.test', testPassword);
		const page = await member('/sign-in');
		expect(page.headers.get('cache-control')).toMatch(/no-store/);
	});

	it('give scripts a nonce that changes', async () => {
		const nonce = async () =>
			/'nonce-([^']+)'/.exec(
				(await anonymous(server())('/sign-in')).headers.get('content-security-policy') ?? ''
			)?.[1];
		const [first, second] = [await nonce(), await nonce()];
		expect(first).toBeTruthy();
		expect(first).not.toBe(second);
	});

	it('would be found wanting without a policy, without HSTS or with a bare cookie', () => {
		const whole = new Headers({
			'content-security-policy': "default-src 'none'; frame-ancestors 'none'",
			'strict-transport-security': 'max-age=63072000',
			'x-content-type-options': 'nosniff',
			'referrer-policy': 'same-origin'
		});
		expect(score(whole, [])).toBeGreaterThanOrEqual(110);
		for (const name of ['content-security-policy', 'strict-transport-security']) {
			const without = new Headers(whole);
			without.delete(name);
			expect(score(without, [])).toBeLessThan(110);
		}
		expect(score(whole, ['a=b; SameSite=Lax'])).toBeLessThan(110);
	});
});
