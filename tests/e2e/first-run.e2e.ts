import { expect, test as base } from '@playwright/test';
import { expectNoBarriers } from '../support/demo-page';
import { startServer, type RunningServer } from '../support/server';

/** An empty database for every journey: the built application as it comes up the first time. */
const test = base.extend<{ server: RunningServer }>({
	server: async ({ browserName: _ }, use) => {
		const server = await startServer();
		await use(server);
		await server.stop();
	}
});

test.describe.configure({ timeout: 180_000 });

test('an owner sets the gym up, invites a coach, who comes in by the mailed link', async ({
	page,
	server,
	browser
}) => {
	await page.goto(server.origin);
	await expect(page.getByRole('heading', { name: 'Set up your gym' })).toBeVisible();
	await expectNoBarriers(page);

	const code = /enter the code ([\w-]+)/.exec(server.output())?.[1] ?? '';
	await page.getByLabel('Code').fill('AAAA-AAAA-AAAA');
	await page.getByLabel('Name of the gym').fill('Harbour Barbell');
	await page.getByLabel('Town or quarter').fill('Sligo');
	await page.getByLabel('Time zone').fill('Europe/Dublin');
	await page.getByLabel('Room 1').fill('Floor');
	await page.getByLabel('Posted limit').first().fill('16');
	await page.getByLabel('Name', { exact: true }).fill('Ada Byrne');
	await page.getByLabel('Email').fill('ada@gym.test');
	await page.getByLabel('Password').fill('four bells on the loft');
	await page.getByRole('button', { name: 'Make the gym' }).click();

	await expect(page.getByRole('alert')).toContainText('That is not the code in the log.');
	await expect(page.getByLabel('Name of the gym')).toHaveValue('Harbour Barbell');
	await expectNoBarriers(page);

	await page.getByLabel('Code').fill(code);
	await page.getByLabel('Password').fill('four bells on the loft');
	await page.getByRole('button', { name: 'Make the gym' }).click();
	await expect(page.getByRole('heading', { name: 'Settings' })).toBeVisible();
	await expectNoBarriers(page);

	await page.goto(`${server.origin}/office/people`);
	await page.getByLabel('Name', { exact: true }).fill('Grace Kelly');
	await page.getByLabel('Email').fill('grace@gym.test');
	await page.getByLabel('Role', { exact: true }).selectOption('Coach');
	await page.getByRole('button', { name: 'Invite', exact: true }).click();
	await expect(page.getByRole('status')).toContainText('Invited.');
	await expect(page.getByText('grace@gym.test')).toBeVisible();
	await expectNoBarriers(page);

	await page.goto(`${server.origin}/office/audit`);
	await expect(
		page.getByRole('listitem').filter({ hasText: 'Invited a person: Grace Kelly' })
	).toBeVisible();
	await expectNoBarriers(page);

	const coach = await (await browser.newContext()).newPage();
	await coach.goto(`${server.origin}/sign-in?to=/sign-out`);
	await expectNoBarriers(coach);
	await coach.getByLabel('Email').fill('grace@gym.test');
	await coach.getByRole('button', { name: 'Email me a sign-in link' }).click();
	await expect(coach.getByRole('status')).toContainText('Look in your mail.');
	await expectNoBarriers(coach);

	const link = await mailedLink(server, 'grace@gym.test');
	await coach.goto(link);
	await coach.waitForURL((url) => !url.pathname.startsWith('/sign-in'));
	const session = await coach.request.get(`${server.origin}/auth/session`);
	expect(await session.json()).toMatchObject({ user: { name: 'Grace Kelly' } });

	const other = await (await browser.newContext()).newPage();
	await other.goto(link);
	await expect(other.getByRole('alert')).toContainText('used already');
	await expectNoBarriers(other);
});

test('a member signs up with a password, signs out, and is known again', async ({
	page,
	server
}) => {
	const code = /enter the code ([\w-]+)/.exec(server.output())?.[1] ?? '';
	await setUp(server, code);
	await page.goto(`${server.origin}/sign-up`);
	await expectNoBarriers(page);
	await page.getByLabel('Name').fill('Sorcha');
	await page.getByLabel('Email').fill('sorcha@gym.test');
	await page.getByLabel('Password').fill('sorcha12345');
	await page.getByRole('button', { name: 'Make my account' }).click();
	await expect(page.getByRole('alert')).toContainText('harder to guess');
	await page.getByLabel('Password').fill('rowing before breakfast');
	await page.getByRole('button', { name: 'Make my account' }).click();
	await page.waitForURL(`${server.origin}/classes`);

	await page.goto(`${server.origin}/sign-out`);
	await expectNoBarriers(page);
	await page.getByRole('button', { name: 'Sign out' }).last().click();
	await page.goto(`${server.origin}/sign-in?with=password`);
	await page.getByLabel('Email').fill('sorcha@gym.test');
	await page.getByLabel('Password').fill('rowing after breakfast');
	await page.getByRole('button', { name: 'Sign in' }).click();
	await expect(page.getByRole('alert')).toContainText('do not belong together');
	await expect(page.getByLabel('Email')).toHaveValue('sorcha@gym.test');
	await expectNoBarriers(page);
	await page.getByLabel('Password').fill('rowing before breakfast');
	await page.getByRole('button', { name: 'Sign in' }).click();
	await page.waitForURL(`${server.origin}/classes`);
});

async function setUp(server: RunningServer, code: string) {
	const form = new URLSearchParams({
		code,
		'gym.name': 'Harbour Barbell',
		'gym.placeName': 'Sligo',
		'gym.zone': 'Europe/Dublin',
		'gym.currency': 'EUR',
		'gym.locale': 'en-IE',
		'gym.loadUnit': 'kg',
		'gym.weekStartsOn': '1',
		'rooms.0.name': 'Floor',
		'rooms.0.places': '16',
		'owner.name': 'Ada Byrne',
		'owner.email': 'ada@gym.test',
		'owner.password': 'four bells on the loft'
	});
	const answer = await fetch(`${server.url}/first-run`, {
		method: 'POST',
		redirect: 'manual',
		headers: { origin: server.origin, accept: 'text/html' },
		body: form
	});
	expect(answer.status).toBe(303);
}

async function mailedLink(server: RunningServer, email: string): Promise<string> {
	for (let tries = 0; tries < 80; tries += 1) {
		const answer = await fetch(`${server.mailUrl}/api/mails?to=${email}`);
		const { mails } = (await answer.json()) as { mails: { text: string }[] };
		for (const { text } of mails) {
			const link = /https?:\/\/\S+\/sign-in\/link\?\S+/.exec(text)?.[0];
			if (link) return link;
		}
		await new Promise((later) => setTimeout(later, 100));
	}
	throw new Error('no mail came');
}
