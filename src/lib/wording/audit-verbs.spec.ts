import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { auditVerbWords, knownAuditVerbs } from './audit-verbs';

const server = 'src/lib/server';
const written = readdirSync(server, { recursive: true, encoding: 'utf8' })
	.filter((file) => file.endsWith('.ts') && !file.endsWith('.spec.ts'))
	.flatMap((file) => readFileSync(join(server, file), 'utf8').split('\n'))
	.filter((line) => line.includes('verb: '))
	.flatMap((line) => [...line.matchAll(/'([a-z-]+\.[a-z-]+)'/g)].map(([, verb]) => verb!));

describe('the audit log in words', () => {
	it('says every verb that a command writes', () => {
		expect(written.length).toBeGreaterThan(40);
		expect(written.filter((each) => !knownAuditVerbs.has(each))).toEqual([]);
	});

	it('knows no verb that nothing writes', () => {
		const all = new Set(written);
		expect([...knownAuditVerbs].filter((each) => !all.has(each))).toEqual([]);
	});

	it('shows a verb of another version as it was written', () => {
		expect(auditVerbWords('slots.call-off')).toBe('Called a class off');
		expect(auditVerbWords('slots.sing')).toBe('slots.sing');
	});
});
