import { expect } from '@playwright/test';
import { addDays, weekOf } from '../../src/lib/domain/calendar/civil-date';
import { localDateOf } from '../../src/lib/domain/calendar/zone';
import { expectNoBarriers, open, scriptsReady, signIn, test } from '../support/demo-page';

const zone = 'Europe/Dublin';

/** Past what the demo has laid and published. */
const farWeekOn = () => weekOf(addDays(localDateOf(Date.now(), zone), 63));

test('a head coach counts kit, writes a session, adds a class, lays the session on it and publishes the week', async ({
	page,
	server
}) => {
	test.setTimeout(240_000);
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
	await page.getByRole('link', { name: /Loft basics/ }).click();
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
	await page.getByLabel('Title', { exact: true }).fill('Loft basics');
	await page.getByRole('button', { name: 'Save changes' }).click();
	await expect(page.getByText('Saved as revision 2')).toBeVisible();
	await expectNoBarriers(page);

	await open(page, `${server.origin}/plan/timetable/rooms`);
	await expect(page.getByText('counts everyone in it, coaches too')).toBeVisible();
	await page.getByLabel('Name').last().fill('Yard');
	await page.getByLabel('Posted limit').last().fill('12');
	await page.getByRole('button', { name: 'Add', exact: true }).click();
	await expect(page.getByRole('button', { name: 'Save Yard' })).toBeVisible();
	await expectNoBarriers(page);

	await open(page, `${server.origin}/plan/timetable/class-types/new`);
	await page.getByLabel('Name', { exact: true }).fill('Yard carries');
	await page.getByLabel('Length in minutes').fill('45');
	await expectNoBarriers(page);
	await page.getByRole('button', { name: 'Add a class type' }).click();
	await expect(page.getByRole('link', { name: 'Yard carries' })).toBeVisible();

	await open(page, `${server.origin}/plan/timetable/series/new`);
	await page.getByLabel('Class type').selectOption('Yard carries');
	await page.getByLabel('Room').selectOption({ label: 'Long Floor, 18 in it at most' });
	await page.getByLabel('First day').fill(farWeekOn());
	await page.getByLabel('Starts at').fill('06:45');
	await page.getByLabel('Coach', { exact: true }).selectOption('Adaeze Obi');
	await page.getByText('Tue', { exact: true }).click();
	await page.getByText('Thu', { exact: true }).click();
	await expect(page.getByText('Every Tuesday and Thursday')).toBeVisible();
	await page.getByRole('button', { name: 'Add a recurring class' }).click();
	await expect(page.getByText('Long Floor is taken by Strength at that time.')).toBeVisible();
	await expectNoBarriers(page);

	await page.getByLabel('Room').selectOption({ label: 'Yard, 12 in it at most' });
	await page.getByRole('button', { name: 'Add it all the same' }).click();
	await page.waitForURL(/\/plan\/timetable\/series\/\d+$/);
	await expect(page.getByRole('heading', { name: 'Yard carries' })).toBeVisible();
	await expectNoBarriers(page);

	await open(page, `${server.origin}/plan/week/${farWeekOn()}`);
	const rows = page.getByRole('checkbox', { name: /06:45 Yard carries, Yard, Adaeze Obi/ });
	await expect(rows).toHaveCount(2);
	await rows.first().check();
	await rows.last().check();
	await page.getByRole('radio', { name: /Loft basics/ }).check();
	await expectNoBarriers(page);
	await page.getByRole('button', { name: 'Look before laying on 2' }).click();

	await expect(page.getByRole('heading', { name: 'Lay Loft basics' })).toBeVisible();
	await expect(page.getByText('11 places')).toHaveCount(2);
	await expectNoBarriers(page);
	await page.getByRole('button', { name: 'Lay it on 2' }).click();
	await expect(page.getByRole('status').first()).toContainText('Laid.');

	await page.getByRole('button', { name: 'Publish the week' }).click();
	await expect(page.getByRole('status').first()).toContainText('Published. Members see 2 more');
	await expectNoBarriers(page);

	await open(page, `${server.origin}/plan/shortages`);
	await expect(page.getByRole('heading', { name: /Rowers \d short/ })).toBeVisible();
	await expectNoBarriers(page);
});

test('calling a class off shows who holds a place first, then tells them', async ({
	page,
	server
}) => {
	await signIn(page, server, 'head@ropewalk.example');
	const nextWeekOn = addDays(weekOf(localDateOf(Date.now(), zone)), 7);
	await open(page, `${server.origin}/plan/week/${nextWeekOn}`);
	await page.getByRole('link', { name: /06:30/ }).first().click();
	await expect(page.getByRole('heading', { name: 'Call it off' })).toBeVisible();
	await expectNoBarriers(page);
	await page.getByLabel('Reason', { exact: true }).fill('The coach is ill');
	await page.getByRole('button', { name: 'Call it off' }).click();
	await expect(page.getByText(/people count on this/)).toBeVisible();
	await expectNoBarriers(page);
	await page.getByRole('button', { name: 'Do it and tell them' }).click();
	await expect(page.getByText('Called off: The coach is ill')).toBeVisible();
	await expectNoBarriers(page);
});
