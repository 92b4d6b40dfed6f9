import { paraglideVitePlugin } from '@inlang/paraglide-js';
import { sveltekit } from '@sveltejs/kit/vite';
import tailwindcss from '@tailwindcss/vite';
import { svelteTesting } from '@testing-library/svelte/vite';
import { defineConfig } from 'vitest/config';

/** What `env()` reads in specs of the server; a started server gets its own. */
const testEnv = {
	KITHOUR_MODE: 'test',
	DATABASE_URL: 'file:opened-by-each-test.db',
	ORIGIN: 'http://localhost:4173',
	AUTH_SECRET: 'only-for-tests-only-for-tests-only'
};

export default defineConfig({
	plugins: [
		tailwindcss(),
		paraglideVitePlugin({
			project: './src/lib/wording/project.inlang',
			outdir: './src/lib/wording/compiled',
			strategy: ['baseLocale']
		}),
		sveltekit()
	],
	cacheDir: process.env.VITE_CACHE_DIR,
	ssr: { noExternal: ['rrule'] },
	test: {
		expect: { requireAssertions: true },
		testTimeout: 60_000,
		hookTimeout: 120_000,
		/** Now and then something keeps the main process after the last test: it is not worth a wait. */
		teardownTimeout: 2000,
		/** Vitest leaves one core of two idle otherwise. */
		maxWorkers: 2,
		projects: [
			{
				extends: true,
				test: {
					name: 'unit',
					environment: 'node',
					include: ['src/lib/{domain,forms,wording}/**/*.spec.ts', 'src/routes/**/*.spec.ts']
				}
			},
			{
				extends: true,
				plugins: [svelteTesting()],
				test: {
					name: 'component',
					environment: 'jsdom',
					setupFiles: ['tests/support/jsdom.ts'],
					include: ['src/lib/components/**/*.spec.ts', 'src/routes/**/*.svelte.spec.ts']
				}
			},
			{
				extends: true,
				test: {
					name: 'server',
					environment: 'node',
					include: [
						'src/lib/{server,fakes}/**/*.spec.ts',
						'src/*.spec.ts',
						'tests/server/**/*.spec.ts'
					],
					globalSetup: ['tests/support/template-database.ts'],
					env: testEnv,
					testTimeout: 120_000
				}
			},
			{
				extends: true,
				test: {
					name: 'faults',
					environment: 'node',
					include: ['tests/faults/**/*.spec.ts'],
					globalSetup: ['tests/support/template-database.ts'],
					env: testEnv,
					testTimeout: 180_000
				}
			}
		]
	}
});
