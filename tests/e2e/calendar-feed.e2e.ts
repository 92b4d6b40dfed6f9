import { expect } from '@playwright/test';
import ICAL from 'ical.js';
import { expectNoBarriers, open, signIn, test } from '../support/demo-page';

test('a phone calendar reads a member’s address, which is shown once and can be ended', async ({
	page,
	server
}) => {
	await signIn(page, server, 'member@ropewalk.example');
	await open(page, `${server.origin}/me`);
	await expectNoBarriers(page);
	await page.getByLabel('Device', { exact: true }).fill('My phone');
	await page.getByRole('button', { name: 'Make an address' }).click();
	const address = (await page.getByText(`${server.origin}/feeds/`).textContent())!.trim();
	await expectNoBarriers(page);

	const first = await fetch(address);
	expect(first.headers.get('content-type')).toContain('text/calendar');
	const text = await first.text();
	const entries = new ICAL.Component(ICAL.parse(text)).getAllSubcomponents('vevent');
	expect(entries.length).toBeGreaterThan(0);
	expect(await (await fetch(address)).text()).toBe(text);
	const again = await fetch(address, { headers: { 'if-none-match': first.headers.get('etag')! } });
	expect(again.status).toBe(304);

	await page.getByRole('button', { name: 'End the address of My phone' }).click();
	await expect(page.getByRole('button', { name: 'End the address of My phone' })).toHaveCount(0);
	expect((await fetch(address)).status).toBe(404);
	await open(page, `${server.origin}/me`);
	await expect(page.getByText(address)).toHaveCount(0);
});
