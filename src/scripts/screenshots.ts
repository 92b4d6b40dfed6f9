import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { chromium, type Page } from '@playwright/test';
import { seededDatabase } from '../../tests/support/seeded-database';
import { startServer } from '../../tests/support/server';

/** `npm run screenshots`: pictures of the built product on the demo's data, for the README and for a look. */
const folder = join(import.meta.dirname, 'screenshots');
const hourMs = 3_600_000;
const args =
	'--no-sandbox --disable-gpu --disable-quic --no-first-run --disable-background-networking --disable-component-update --disable-sync'.split(
		' '
	);

type Shot = {
	name: string;
	as: string;
	width: number;
	height: number;
	theme: 'light' | 'dark';
	path: string;
};
const all: Shot[] = [
	{
		name: 'week-1440-light',
		as: 'member',
		width: 1440,
		height: 900,
		theme: 'light',
		path: '/classes'
	},
	{
		name: 'week-1440-dark',
		as: 'member',
		width: 1440,
		height: 900,
		theme: 'dark',
		path: '/classes'
	},
	{
		name: 'class-390-light',
		as: 'member',
		width: 390,
		height: 844,
		theme: 'light',
		path: '/classes/{slot}'
	},
	{
		name: 'editor-1440-light',
		as: 'head',
		width: 1440,
		height: 900,
		theme: 'light',
		path: '/plan/sessions/1'
	},
	{
		name: 'roll-1024-light',
		as: 'desk',
		width: 1024,
		height: 768,
		theme: 'light',
		path: '/desk/{slot}'
	}
];

mkdirSync(folder, { recursive: true });
const server = await startServer({
	template: seededDatabase(Math.floor(Date.now() / hourMs) * hourMs)
});
const browser = await chromium.launch({ executablePath: '/usr/bin/chromium', args });
try {
	const slot = await nextSlot();
	for (const shot of all) await take(shot, slot);
} finally {
	await browser.close();
	await server.stop();
}

async function take({ name, as, width, height, theme, path }: Shot, slot: number): Promise<void> {
	const page = await browser.newPage({
		viewport: { width, height },
		colorScheme: theme,
		locale: 'en-IE'
	});
	await signIn(page, `${as}@ropewalk.example`);
	await page.goto(server.origin + path.replace('{slot}', String(slot)), {
		waitUntil: 'networkidle'
	});
	await page.screenshot({ path: join(folder, `${name}.png`) });
	await page.close();
	console.log(`${name}.png`);
}

async function signIn(page: Page, email: string): Promise<void> {
	await page.goto(`${server.origin}/sign-in?with=password`);
	await page.getByLabel('Email').fill(email);
	await page.getByLabel('Password').fill('ropewalk-demo');
	await page.getByRole('button', { name: 'Sign in' }).click();
	await page.waitForURL((url) => !url.pathname.startsWith('/sign-in'));
}

/** A class to come, with places left and its session out. */
async function nextSlot(): Promise<number> {
	const day = (ms: number) => new Date(ms).toISOString().slice(0, 10);
	const range = `from=${day(Date.now())}&to=${day(Date.now() + 3 * 24 * hourMs)}`;
	const answer = await fetch(`${server.origin}/api/slots?${range}`);
	const { slots } = (await answer.json()) as {
		slots: { id: number; startsAt: string; blocks?: unknown; places: { free: number } }[];
	};
	const coming = slots.filter((s) => Date.parse(s.startsAt) > Date.now() + hourMs && s.blocks);
	return (coming.find(({ places }) => places.free > 2) ?? coming[0])!.id;
}
