import { defineConfig, devices } from '@playwright/test';

const chromium = {
	executablePath: '/usr/bin/chromium',
	args: [
		'--no-sandbox',
		'--disable-gpu',
		'--disable-quic',
		'--no-first-run',
		'--disable-background-networking',
		'--disable-component-update',
		'--disable-sync'
	]
};

/** Each journey runs at desktop and at phone width; the built app is started by its own fixture (tests/support/app.ts). */
export default defineConfig({
	testDir: 'tests/e2e',
	testMatch: '**/*.e2e.ts',
	fullyParallel: false,
	// Journeys wait more than they work: three keep two cores busy.
	workers: 3,
	forbidOnly: true,
	retries: 1,
	timeout: 180_000,
	expect: { timeout: 15_000 },
	reporter: [['list'], ['json', { outputFile: 'test-results/e2e.json' }]],
	use: { launchOptions: chromium, trace: 'off', locale: 'en-IE', timezoneId: 'Europe/Dublin' },
	projects: [
		{ name: 'desktop', use: { viewport: { width: 1280, height: 800 } } },
		{
			name: 'phone',
			use: { ...devices['Pixel 7'], viewport: { width: 390, height: 844 }, launchOptions: chromium }
		}
	]
});
