import Stripe from 'stripe';
import { refuse, type Refused } from '$lib/domain/refusal';
import { write } from '../db';
import { stripeEvents } from '../db/schema';

/** Seconds between a signature and its arrival: the service's own default. */
const toleranceS = 300;

/**
 * Stores an event of the payment service, once however often it comes. Its signature is over the
 * body as it was sent: `raw` must not have been parsed. `now` is epoch ms.
 */
export async function storeStripeEvent(
	raw: string,
	signature: string | null,
	secret: string | null,
	now: number
): Promise<{ ok: true; isNew: boolean } | Refused<'payment-unavailable' | 'bad-signature'>> {
	if (secret === null) return refuse('payment-unavailable');
	const event = signed(raw, signature ?? '', secret, now);
	if (!event) return refuse('bad-signature');
	const { id, type, created } = event;
	const rows = await write((tx) =>
		tx
			.insert(stripeEvents)
			.values({ id, type, happenedAt: created * 1000, payload: raw, receivedAt: now })
			.onConflictDoNothing()
			.returning({ id: stripeEvents.id })
	);
	return { ok: true, isNew: rows.length > 0 };
}

function signed(raw: string, signature: string, secret: string, now: number): Stripe.Event | null {
	try {
		return Stripe.webhooks.constructEvent(raw, signature, secret, toleranceS, undefined, now);
	} catch {
		return null;
	}
}
