import { describe, expect, it } from 'vitest';
import { returnPath } from './return-path';

const origin = 'https://gym.example';

/** Common practice for open redirects, from memory: each has fooled some parser. */
const hostile = [
	'//evil.example',
	'///evil.example',
	'////evil.example',
	'/\\evil.example',
	'\\/evil.example',
	'\\\\evil.example',
	'/\\/evil.example',
	'/%5cevil.example',
	'/%5Cevil.example',
	'/%5c%5cevil.example',
	'/%2f%2fevil.example',
	'/%2Fevil.example',
	'%2f%2fevil.example',
	'/%09/evil.example',
	'/\t/evil.example',
	'/\n/evil.example',
	'/\r/evil.example',
	'/%0d%0aLocation:%20https://evil.example',
	'/ok\r\nLocation: https://evil.example',
	'/%00//evil.example',
	'\u0000//evil.example',
	' //evil.example',
	'https://evil.example',
	'HTTPS://evil.example',
	'https:evil.example',
	'https:/evil.example',
	'http://gym.example.evil.example',
	'https://gym.example@evil.example',
	'@evil.example',
	'.evil.example',
	'javascript:alert(1)',
	'JaVaScRiPt:alert(1)',
	'java\nscript:alert(1)',
	'data:text/html,<script>alert(1)</script>',
	'vbscript:x',
	'/.//evil.example',
	'/..//evil.example',
	'/a/..//evil.example',
	'/〱evil.example',
	'/／evil.example',
	'/#//evil.example',
	'/<script>',
	'',
	'?to=//evil.example'
];

describe('where a sign-in leads back to', () => {
	it('has at least the forty payloads of goal G22', () => {
		expect(hostile.length).toBeGreaterThanOrEqual(40);
	});

	it.each(hostile)('stays on this site for %j', (to) => {
		const path = returnPath(to, '/classes');
		expect(new URL(path, origin).origin).toBe(origin);
		expect(path).toBe('/classes');
	});

	it.each(['/', '/classes', '/classes/12?from=2026-12-01', '/desk/people?name=O%27Hara', '/@home'])(
		'keeps our own %s',
		(to) => {
			expect(returnPath(to, '/elsewhere')).toBe(to);
		}
	);

	it.each(['/sign-in', '/sign-in?to=/sign-in', '/sign-out', '/auth/signout'])(
		'does not lead to the door %s',
		(to) => {
			expect(returnPath(to, '/classes')).toBe('/classes');
		}
	);
});
