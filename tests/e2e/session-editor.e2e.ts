import { expect } from '@playwright/test';
import { expectNoBarriers, open, scriptsReady, signIn, test } from '../support/demo-page';

test('the head coach counts kit, keeps a movement’s ladder, and writes a session that loses nothing', async ({
	page,
	server
}) => {
	await signIn(page, server, 'head@ropewalk.example');
	await open(page, `${server.origin}/plan/kit`);
	await expectNoBarriers(page);
	await page.getByLabel('One piece is a').fill('sandbag');
	await page.getByLabel('Several are').fill('sandbags');
	await page
		.getByRole('region', { name: 'A new kind of kit' })
		.getByRole('button', { name: 'Add' })
		.click();
	await expect(page.getByRole('heading', { name: 'sandbags' })).toBeVisible();

	await open(page, `${server.origin}/plan/movements`);
	await expectNoBarriers(page);
	await page.getByLabel('Find a movement').fill('pull-up');
	await page.getByRole('link', { name: /^Pull-up/ }).click();
	await page.waitForURL(/movements\/\d+/);
	await expectNoBarriers(page);

	await open(page, `${server.origin}/plan/sessions`);
	await expectNoBarriers(page);
	await page.getByRole('link', { name: /Pull day, light bells/ }).click();
	await page.waitForURL(/sessions\/\d+/);
	await scriptsReady(page);
	await expect(page.getByText('Fits the class')).toBeVisible();
	await expectNoBarriers(page);
	await page.getByLabel('Title', { exact: true }).fill('');
	await page.getByLabel('Aim').fill('Still here after a bad save');
	await page
		.getByLabel('Title', { exact: true })
		.evaluate((input) => input.removeAttribute('required'));
	await page.getByRole('button', { name: 'Save changes' }).click();
	await expect(page.getByText('Nothing was saved, and nothing you typed is lost.')).toBeVisible();
	await expect(page.getByLabel('Aim')).toHaveValue('Still here after a bad save');
	await page.getByLabel('Title', { exact: true }).fill('Pull day, light bells');
	await page.getByRole('button', { name: 'Save changes' }).click();
	await expect(page.getByText('Saved as revision 2')).toBeVisible();
	await expectNoBarriers(page);
});
