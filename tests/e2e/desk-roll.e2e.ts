import { expect } from '@playwright/test';
import { expectNoBarriers, open, signIn, test } from '../support/demo-page';

const hourMs = 3_600_000;

test('the desk takes a roll: checks in, undoes, and finds a member to give a pass', async ({
	page,
	server
}) => {
	await signIn(page, server, 'desk@ropewalk.example');
	await open(page, `${server.origin}/desk`);
	await expectNoBarriers(page);

	const day = new Date(Date.now() - 24 * hourMs * (new Date().getUTCDay() === 1 ? 2 : 1))
		.toISOString()
		.slice(0, 10);
	const answer = await page.request.get(`${server.origin}/api/slots?from=${day}&to=${day}`);
	const slot = (await answer.json()).slots.find(
		(s: { places: { booked: number } }) => s.places.booked > 2
	);
	await open(page, `${server.origin}/desk/${slot.id}`);
	await expectNoBarriers(page);
	const undo = page.getByRole('button', { name: /^Undo:/ });
	const before = await undo.count();
	await undo.first().click();
	await expect(undo).toHaveCount(before - 1);
	await page
		.getByRole('button', { name: /^Check in:/ })
		.first()
		.click();
	await expect(undo).toHaveCount(before);

	await open(page, `${server.origin}/desk/people`);
	await expectNoBarriers(page);
	await page.getByLabel('Name or e-mail').fill('sorcha');
	await page.getByRole('button', { name: 'Look' }).click();
	await page.getByRole('link', { name: /Sorcha Finnerty/ }).click();
	await expect(page.getByRole('heading', { level: 1 })).toHaveText('Sorcha Finnerty');
	await page.getByText('Grant a pass').click();
	await page.getByLabel('Kind').selectOption('pack');
	await page.getByLabel('Credits', { exact: true }).fill('5');
	await page.getByRole('button', { name: 'Grant it' }).click();
	await expect(page.getByText('5 classes left')).toBeVisible();
	await expectNoBarriers(page);
});
