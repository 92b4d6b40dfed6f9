import { json } from '@sveltejs/kit';
import { env } from '$lib/server/env';
import { storeStripeEvent } from '$lib/server/payments/webhook';
import { problem } from '$lib/server/refuse';
import { safeText } from '$lib/server/safe-body';
import type { RequestHandler } from './$types';

export const POST: RequestHandler = async (event) => {
	const raw = await safeText(event);
	const signature = event.request.headers.get('stripe-signature');
	const { stripeWebhookSecret } = env();
	const stored = await storeStripeEvent(raw, signature, stripeWebhookSecret, event.locals.now);
	return stored.ok ? json({ received: true }) : problem(stored);
};
