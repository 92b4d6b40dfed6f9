import { createTransport } from 'nodemailer';
import { mailAddress } from '$lib/domain/people/mail-address';
import type { Queued } from './outbox';

/** For the whole delivery: the library's own timeouts count idle time only. */
const deadlineMs = 30_000;

export type Post = { url: string; from: string };
export type Delivery = { ok: true } | { ok: false; reason: string; isFinal: boolean };

/** Hands one message to the mail server, on a connection of its own. */
export async function deliver(message: Queued, { url, from }: Post): Promise<Delivery> {
	const address = mailAddress.safeParse(message.toAddress);
	if (!address.success) return { ok: false, reason: 'not one plain address', isFinal: true };

	const transport = createTransport({
		url,
		pool: false,
		connectionTimeout: 10_000,
		greetingTimeout: 10_000,
		socketTimeout: 20_000,
		disableFileAccess: true,
		disableUrlAccess: true
	});
	const sending = transport.sendMail({
		from,
		to: { name: '', address: address.data },
		subject: message.subject,
		text: message.text,
		html: message.html,
		messageId: message.messageId,
		...(message.calendar
			? { icalEvent: { method: message.calendarMethod ?? 'PUBLISH', content: message.calendar } }
			: {})
	});
	try {
		await Promise.race([sending, deadline()]);
		return { ok: true };
	} catch (error) {
		sending.catch(() => undefined);
		return refused(error);
	} finally {
		transport.close();
	}
}

/** 5xx means never for this message; anything else may pass (RFC 5321, 4.2.1). */
function refused(error: unknown): Delivery {
	const code = error instanceof Error && 'responseCode' in error ? Number(error.responseCode) : 0;
	const reason = error instanceof Error ? error.message : String(error);
	return { ok: false, reason, isFinal: code >= 500 && code < 600 };
}

const deadline = () =>
	new Promise<never>((_, stop) => {
		setTimeout(() => stop(new Error('took too long')), deadlineMs).unref();
	});
