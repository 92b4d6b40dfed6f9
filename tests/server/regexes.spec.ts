import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { checkSync } from 'recheck';
import ts from 'typescript';
import { describe, expect, it } from 'vitest';

type Found = { where: string; source: string; flags: string };

/** Every regular expression literal in our own scripts and in the scripts of our components. */
function regexesIn(root: string): Found[] {
	return readdirSync(root, { recursive: true, encoding: 'utf8' })
		.filter((file) => /\.(ts|js|svelte)$/.test(file) && !/compiled|\.spec\.ts$/.test(file))
		.flatMap((file) => literals(file, scriptOf(file, readFileSync(join(root, file), 'utf8'))));
}

const scriptOf = (file: string, text: string): string =>
	file.endsWith('.svelte')
		? [...text.matchAll(/<script[^>]*>([^]*?)<\/script>/g)].map((found) => found[1]).join('\n')
		: text;

function literals(file: string, script: string): Found[] {
	const found: Found[] = [];
	const visit = (node: ts.Node): void => {
		if (ts.isRegularExpressionLiteral(node)) {
			const end = node.text.lastIndexOf('/');
			const where = `${file} ${node.text}`;
			found.push({ where, source: node.text.slice(1, end), flags: node.text.slice(end + 1) });
		}
		ts.forEachChild(node, visit);
	};
	visit(ts.createSourceFile(file, script, ts.ScriptTarget.Latest));
	return found;
}

/** What could be made to run for very long, and what could not be told in time. */
function suspicious(found: readonly Found[]): string[] {
	const seen = new Map(found.map((regex) => [`/${regex.source}/${regex.flags}`, regex]));
	const bad: string[] = [];
	for (const { where, source, flags } of seen.values()) {
		// Not `check`: its agent is a process of its own, which was seen never to answer.
		const { status } = checkSync(source, flags, { timeout: 20_000 });
		if (status !== 'safe') bad.push(`${status}: ${where}`);
	}
	return bad;
}

describe('regular expressions (G23)', () => {
	const found = regexesIn('src');

	it('are found in rules, in the server and in components', () => {
		expect(found.some(({ where }) => where.startsWith('lib/domain/calendar'))).toBe(true);
		expect(found.some(({ where }) => where.startsWith('lib/server'))).toBe(true);
	});

	it('cannot be made to run for long by what somebody types', () => {
		expect(suspicious(found)).toEqual([]);
	}, 120_000);

	it('are seen to be rejected where they can', () => {
		const broken = literals(
			'broken.ts',
			String.raw`const words = /^(\w+\s?)+$/; const sum = /^(a|a)*b$/;`
		);
		expect(suspicious(broken).length).toBe(2);
	}, 30_000);
});
