import { describe, expect, it } from 'vitest';
import { readEnv } from './env';

const whole = {
	DATABASE_URL: 'file:data/gym.db',
	ORIGIN: 'https://book.example.org',
	AUTH_SECRET: 'a'.repeat(32),
	MAIL_URL: 'smtp://mail.example.org:25',
	MAIL_FROM: 'desk@example.org'
};
const faults = (source: Record<string, string | undefined>) => {
	const read = readEnv(source);
	return read.ok ? [] : read.faults;
};

describe('what the process is started with', () => {
	it('is production unless something says otherwise', () => {
		expect(readEnv(whole)).toMatchObject({ ok: true, env: { mode: 'production', port: 3000 } });
		expect(readEnv({ ...whole, NODE_ENV: 'development' })).toMatchObject({
			env: { mode: 'development' }
		});
		expect(readEnv({ ...whole, KITHOUR_MODE: 'demo' })).toMatchObject({ env: { mode: 'demo' } });
		expect(faults({ ...whole, KITHOUR_MODE: 'staging' })[0]).toContain('KITHOUR_MODE');
	});

	it.each(['DATABASE_URL', 'ORIGIN', 'AUTH_SECRET', 'MAIL_URL', 'MAIL_FROM'])(
		'names a missing %s in one line, and an empty one too',
		(name) => {
			for (const value of [undefined, '']) {
				const found = faults({ ...whole, [name]: value });
				expect(found).toHaveLength(1);
				expect(found[0]).toMatch(new RegExp(`^${name} `));
				expect(found[0]).not.toContain('\n');
			}
		}
	);

	it.each([
		['DATABASE_URL', 'gym.db'],
		['ORIGIN', 'https://book.example.org/'],
		['ORIGIN', 'book.example.org'],
		['ORIGIN', 'javascript://book.example.org'],
		['AUTH_SECRET', 'short'],
		['MAIL_URL', 'mail.example.org'],
		['MAIL_FROM', 'desk@example.org, other@example.org'],
		['STRIPE_WEBHOOK_SECRET', 'secret'],
		['PORT', '70000'],
		['PORT', 'http']
	])('refuses %s as "%s"', (name, value) => {
		expect(faults({ ...whole, [name]: value })).toEqual([expect.stringMatching(`^${name} `)]);
	});

	it('needs no mail server where the fake stands in', () => {
		const { MAIL_URL: _, MAIL_FROM: __, ...rest } = whole;
		expect(readEnv({ ...rest, KITHOUR_MODE: 'demo' })).toMatchObject({ env: { mailUrl: null } });
	});
});
