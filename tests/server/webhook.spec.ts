import Stripe from 'stripe';
import { describe, expect, it } from 'vitest';
import { db } from '../../src/lib/server/db';
import { stripeEvents } from '../../src/lib/server/db/schema';
import { storeStripeEvent } from '../../src/lib/server/payments/webhook';
import { useDatabase } from '../support/database';

const secret = 'whsec_only_for_tests';
const now = Date.UTC(2026, 11, 1, 12);
const nowS = now / 1000;
const eventOf = (id: string) =>
	JSON.stringify({ id, object: 'event', type: 'invoice.paid', created: nowS - 5, data: {} });

/** Signed by the payment service's own library, as the service signs. */
const sign = (payload: string, { with: key = secret, at = nowS } = {}) =>
	Stripe.webhooks.generateTestHeaderString({ payload, secret: key, timestamp: at });

const arrive = (payload: string, signature: string | null = sign(payload)) =>
	storeStripeEvent(payload, signature, secret, now);

describe('what the payment service tells', () => {
	useDatabase();

	it('is stored once, however often and at whatever moment it comes', async () => {
		const payload = eventOf('evt_1');
		const answers = await Promise.all(Array.from({ length: 20 }, () => arrive(payload)));
		expect(answers.every(({ ok }) => ok)).toBe(true);
		expect(answers.filter((answer) => answer.ok && answer.isNew)).toHaveLength(1);
		expect(await db.select().from(stripeEvents)).toEqual([
			{
				id: 'evt_1',
				type: 'invoice.paid',
				happenedAt: now - 5000,
				payload,
				receivedAt: now,
				actedAt: null
			}
		]);
	});

	it('is not believed without its signature, with another’s, or over another body', async () => {
		const payload = eventOf('evt_2');
		for (const signature of [
			null,
			'',
			't=1,v1=00',
			sign(payload, { with: 'whsec_of_somebody_else' }),
			sign(eventOf('evt_3'))
		]) {
			expect(await arrive(payload, signature)).toMatchObject({ refused: 'bad-signature' });
		}
		expect(await db.select().from(stripeEvents)).toEqual([]);
	});

	it('is not believed 301 seconds after it was signed, and is at 299 (from the service’s handbook)', async () => {
		const payload = eventOf('evt_4');
		expect(await arrive(payload, sign(payload, { at: nowS - 301 }))).toMatchObject({
			refused: 'bad-signature'
		});
		expect(await arrive(payload, sign(payload, { at: nowS - 299 }))).toMatchObject({ ok: true });
	});

	it('is refused where payment is not set up', async () => {
		const payload = eventOf('evt_5');
		expect(await storeStripeEvent(payload, sign(payload), null, now)).toMatchObject({
			refused: 'payment-unavailable'
		});
	});
});
