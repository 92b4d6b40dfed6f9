import { expect } from '@playwright/test';
import { comingSlots, expectNoBarriers, open, signIn, test } from '../support/demo-page';

test('a member finds a class, books it, cannot book twice, changes how, and gives it up', async ({
	page,
	server
}) => {
	await open(page, server.origin);
	await expect(page.getByRole('heading', { level: 1 })).toContainText('a piece of kit');
	await expectNoBarriers(page);

	await signIn(page, server, 'member@ropewalk.example');
	await open(page, `${server.origin}/classes`);
	await expect(
		page.getByRole('link', { name: /places|You are in|Full|Done/ }).first()
	).toBeVisible();
	await expectNoBarriers(page);

	const mine = await comingSlots(page, server);
	const taken = mine
		.filter(({ myBooking }) => myBooking)
		.map(({ startsAt }) => startsAt.slice(0, 10));
	const slot = mine.find((s) => s.places.free > 3 && !taken.includes(s.startsAt.slice(0, 10)))!;
	await open(page, `${server.origin}/classes/${slot.id}`);
	await expect(page.getByRole('heading', { level: 1 })).toHaveText(slot.title);
	await expectNoBarriers(page);
	await page.getByRole('button', { name: /Book my place/ }).dblclick();
	await expect(page.getByRole('heading', { level: 1 })).toContainText('See you on the floor');
	await expectNoBarriers(page);

	const again = await page.request.post(`${server.origin}/api/slots/${slot.id}/bookings`, {
		headers: { origin: server.origin },
		data: {}
	});
	expect(again.status()).toBe(409);
	expect((await again.json()).type).toContain('already-booked');

	await open(page, `${server.origin}/booked`);
	await expect(
		page.getByRole('link', { name: new RegExp(slot.title.replace(/[&]/g, '.')) }).first()
	).toBeVisible();
	await expectNoBarriers(page);

	await open(page, `${server.origin}/classes/${slot.id}`);
	await page.getByRole('button', { name: 'Give up my place' }).click();
	await expect(page.getByText('Your place was given up in time')).toBeVisible();
});

test('the first on the waitlist has the place that comes free, and is told', async ({
	page,
	server
}) => {
	await signIn(page, server, 'desk@ropewalk.example');
	const slots = await comingSlots(page, server, 6);
	const slot = slots.find(({ places }) => places.free === 0 && places.waitlisted > 0)!;
	const roll = await (await page.request.get(`${server.origin}/api/slots/${slot.id}/roll`)).json();
	const first = roll.roll.find((row: { position?: number }) => row.position === 1);
	const booked = roll.roll.find((row: { status: string }) => row.status === 'booked');
	const gone = await page.request.delete(`${server.origin}/api/bookings/${booked.bookingId}`, {
		headers: { origin: server.origin }
	});
	expect(gone.status()).toBe(200);
	const after = await (await page.request.get(`${server.origin}/api/slots/${slot.id}/roll`)).json();
	const now = after.roll.find((row: { bookingId: number }) => row.bookingId === first.bookingId);
	expect(['booked', 'waitlisted']).toContain(now.status);
	expect(after.roll.filter((row: { status: string }) => row.status === 'booked').length).toBe(
		roll.roll.filter((row: { status: string }) => row.status === 'booked').length
	);
});
