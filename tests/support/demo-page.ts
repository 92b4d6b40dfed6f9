import AxeBuilder from '@axe-core/playwright';
import { expect, test as base, type Page } from '@playwright/test';
import { addDays } from '../../src/lib/domain/calendar/civil-date';
import { localDateOf } from '../../src/lib/domain/calendar/zone';
import { seededDatabase } from './seeded-database';
import { startServer, type RunningServer } from './server';

const hourMs = 3_600_000;

/** The demo gym as it stands this hour, served by the built application: one for each journey. */
export const test = base.extend<{ server: RunningServer }>({
	server: async ({ browserName: _ }, use) => {
		const template = seededDatabase(Math.floor(Date.now() / hourMs) * hourMs);
		const server = await startServer({ template });
		await use(server);
		await server.stop();
	}
});

/** Every page that a journey opens has no accessibility fault that axe can see. No page has frames. */
export async function expectNoBarriers(page: Page): Promise<void> {
	const { violations } = await new AxeBuilder({ page })
		.setLegacyMode(true)
		.options({ preload: false, resultTypes: ['violations'] })
		.analyze();
	expect(violations.map(({ id, nodes }) => `${id}: ${nodes[0]?.html}`)).toEqual([]);
}

export async function signIn(page: Page, { origin }: RunningServer, email: string): Promise<void> {
	await page.goto(`${origin}/sign-in?with=password`);
	await page.getByLabel('Email').fill(email);
	await page.getByLabel('Password').fill('ropewalk-demo');
	await page.getByRole('button', { name: 'Sign in' }).click();
	await page.waitForURL((url) => !url.pathname.startsWith('/sign-in'));
}

/** Opens a page and lets its scripts arrive: what is picked before them may be set back. */
export async function open(page: Page, address: string): Promise<void> {
	await page.goto(address);
	await scriptsReady(page);
}

/** Waits until the page that was loaded listens. */
export async function scriptsReady(page: Page): Promise<void> {
	await page.locator('html[data-scripts=ready]').waitFor();
}

export type DemoSlot = {
	id: number;
	title: string;
	startsAt: string;
	status: string;
	room: { name: string };
	coaches: { name: string }[];
	places: { limit: number; booked: number; free: number; waitlisted: number };
	myBooking?: { status: string };
};

/** The demo's classes from today on, as the API answers whoever is signed in. */
export async function comingSlots(
	page: Page,
	{ origin }: RunningServer,
	days = 10
): Promise<DemoSlot[]> {
	const from = localDateOf(Date.now(), 'Europe/Dublin');
	const answer = await page.request.get(
		`${origin}/api/slots?from=${from}&to=${addDays(from, days)}`
	);
	const { slots } = (await answer.json()) as { slots: DemoSlot[] };
	return slots.filter(({ startsAt }) => Date.parse(startsAt) > Date.now() + 4 * hourMs);
}
