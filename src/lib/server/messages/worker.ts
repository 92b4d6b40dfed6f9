import { now } from '../clock';
import { log } from '../log';
import { deliver, type Post } from './deliver';
import { claimDue, markFailed, markSent, type Queued } from './outbox';

const everyMs = 1000;
const atATime = 10;

/** Sends what is due, once a second; returns what stops it after the mail under way. */
export function startOutbox(post: Post): () => Promise<void> {
	let round: Promise<void> = Promise.resolve();
	let isBusy = false;
	const timer = setInterval(() => {
		if (isBusy) return;
		isBusy = true;
		round = sendDue(post)
			.catch((error: unknown) => log.error({ err: error }, 'outbox stopped for this round'))
			.finally(() => void (isBusy = false));
	}, everyMs);
	timer.unref();
	return async () => {
		clearInterval(timer);
		await round;
	};
}

/** One round: claim, send, mark. Nothing of the network happens while a write is open. */
export async function sendDue(post: Post): Promise<void> {
	const claimed = await claimDue(now(), atATime);
	for (const message of claimed) await send(message, post);
}

async function send(message: Queued, post: Post): Promise<void> {
	const delivery = await deliver(message, post);
	if (delivery.ok) return markSent(message.id, now());
	log.warn({ message: message.id, kind: message.kind, reason: delivery.reason }, 'mail not sent');
	await markFailed(message, delivery, now());
}
