import { expect } from '@playwright/test';
import { comingSlots, expectNoBarriers, open, signIn, test } from '../support/demo-page';

test('a coach reads who is coming, what to do and what to put out, and no class of others', async ({
	page,
	server
}) => {
	await signIn(page, server, 'coach@ropewalk.example');
	await open(page, `${server.origin}/floor`);
	await expect(page.getByRole('heading', { level: 1 })).toHaveText('My classes');
	await expectNoBarriers(page);

	const slots = await comingSlots(page, server, 8);
	const own = slots.find(
		({ coaches, places }) => coaches.some(({ name }) => name === 'Tomasz Wilk') && places.booked > 3
	)!;
	await open(page, `${server.origin}/floor/${own.id}`);
	await expect(page.getByRole('heading', { level: 1 })).toContainText(own.title);
	await expect(page.getByText('Put out:').first()).toBeVisible();
	await expect(page.getByRole('button', { name: /Check in:/ }).first()).toBeVisible();
	await expectNoBarriers(page);

	const other = slots.find(({ coaches }) => coaches.every(({ name }) => name !== 'Tomasz Wilk'))!;
	const answer = await page.goto(`${server.origin}/floor/${other.id}`);
	expect(answer?.status()).toBe(404);
	await expectNoBarriers(page);
});
