import js from '@eslint/js';
import svelte from 'eslint-plugin-svelte';
import globals from 'globals';
import { defineConfig } from 'eslint/config';
import ts from 'typescript-eslint';
import svelteConfig from './svelte.config.js';

const drizzle = ['drizzle-orm', 'drizzle-orm/*', '@libsql/client'];

/** One arrow of DEVELOPERS.md: `files` may not import what `group` names. */
const arrow = (files, group, message, ignores = []) => ({
	files,
	ignores: ['**/*.spec.ts', ...ignores],
	rules: { 'no-restricted-imports': ['error', { patterns: [{ group, message }] }] }
});

export default defineConfig(
	{
		ignores: [
			'build/',
			'.svelte-kit/',
			'node_modules/',
			'data/',
			'drizzle/',
			'coverage/',
			'test-results/',
			'src/lib/wording/compiled/',
			'src/lib/wording/project.inlang/'
		]
	},
	js.configs.recommended,
	...ts.configs.recommended,
	...svelte.configs.recommended,
	{
		languageOptions: { globals: { ...globals.browser, ...globals.node } },
		rules: {
			'no-undef': 'off',
			'no-console': 'error',
			eqeqeq: ['error', 'always', { null: 'ignore' }],
			'@typescript-eslint/no-unused-vars': [
				'error',
				{ argsIgnorePattern: '^_', varsIgnorePattern: '^_' }
			],
			'svelte/no-navigation-without-resolve': 'off',
			'svelte/no-at-html-tags': 'error'
		}
	},
	{
		files: ['**/*.svelte', '**/*.svelte.ts'],
		languageOptions: { parserOptions: { parser: ts.parser, svelteConfig } }
	},
	{
		files: ['src/scripts/**', 'tests/bench/**', 'tests/support/run.js'],
		rules: { 'no-console': 'off' }
	},

	arrow(
		['src/lib/domain/**'],
		[
			...drizzle,
			'$app/*',
			'$env/*',
			'$lib/*',
			'!$lib/domain',
			'!$lib/domain/*',
			'svelte',
			'@sveltejs/*',
			'node:*',
			'**/server/**',
			'**/components/**',
			'**/routes/**'
		],
		'Rules are pure: they import rules and the date and rule libraries only.'
	),
	{
		files: ['src/lib/domain/**'],
		ignores: ['**/*.spec.ts'],
		rules: {
			'no-restricted-syntax': [
				'error',
				{
					selector: "CallExpression[callee.object.name='Date'][callee.property.name='now']",
					message: 'The clock is an argument.'
				},
				{
					selector: "NewExpression[callee.name='Date'][arguments.length=0]",
					message: 'The clock is an argument.'
				},
				{
					selector: "CallExpression[callee.object.name='Math'][callee.property.name='random']",
					message: 'Chance is an argument.'
				},
				{
					selector: "MemberExpression[object.name='Temporal'][property.name='Now']",
					message: 'The clock is an argument.'
				}
			]
		}
	},
	arrow(
		['src/lib/components/**'],
		[...drizzle, '$lib/server/*', '**/server/**', '**/routes/**', '$app/server', '$env/*'],
		'Components know nothing: props in, snippets and callbacks out.'
	),
	arrow(
		['src/lib/components/ui/**'],
		[...drizzle, '$lib/server/*', '$lib/domain/*', '**/routes/**'],
		'components/ui has no domain nouns.'
	),
	arrow(
		['src/lib/forms/**'],
		['$lib/server/*', '**/server/**', '**/components/**', '**/routes/**', '$app/*', '$env/*'],
		'Forms import rules and zod; what reaches the server or a component belongs there.',
		[]
	),
	arrow(
		['src/lib/server/**'],
		['**/routes/**', '**/components/**', '$app/*', '$env/*', 'svelte'],
		'Commands and queries know no page: rules, database and the commands they cause.',
		['src/lib/server/db/seed/**']
	),
	arrow(
		['src/lib/server/db/schema/**'],
		['$lib/server/*', '$lib/forms/*', '**/routes/**'],
		'The schema imports rules only.'
	),
	arrow(
		['src/routes/**'],
		[...drizzle, '$lib/server/db', '$lib/server/db/*', '**/server/db/**'],
		'Routes translate, ask, answer: the database is behind a query or a command.'
	)
);
