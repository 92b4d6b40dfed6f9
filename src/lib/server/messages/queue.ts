import { createHash } from 'node:crypto';
import { mailAddress } from '$lib/domain/people/mail-address';
import type { Tx } from '../db';
import { outboxMessages } from '../db/schema';
import { env } from '../env';

/** What a message says, in both of its forms. */
export type Letter = { subject: string; text: string; html: string };

export type Message = Letter & {
	/** What it is about: "sign-in-link", "promoted". */
	kind: string;
	to: string;
	personId: number | null;
	/** One message a fact: the same key again is not sent again. */
	factKey: string;
	now: number;
	/** An iCalendar body to attach, with its METHOD. */
	calendar?: { body: string; method: string };
};

/**
 * Puts mail in the outbox, in the transaction of the fact that causes it; a worker sends it.
 * Its Message-ID comes from the fact, so that a second delivery after a crash is recognised.
 */
export async function queueMessage(tx: Tx, message: Message): Promise<void> {
	await tx
		.insert(outboxMessages)
		.values({
			kind: message.kind,
			factKey: message.factKey,
			personId: message.personId,
			toAddress: mailAddress.parse(message.to),
			subject: oneLine(message.subject),
			text: message.text,
			html: message.html,
			calendar: message.calendar?.body ?? null,
			calendarMethod: message.calendar?.method ?? null,
			messageId: messageId(message.factKey),
			createdAt: message.now,
			nextAttemptAt: message.now
		})
		.onConflictDoNothing({ target: outboxMessages.factKey });
}

/** A name with a line break must not become a header. */
// eslint-disable-next-line no-control-regex
const oneLine = (subject: string) => subject.replace(/[\u0000-\u001f\u007f]+/g, ' ').slice(0, 200);

const messageId = (factKey: string) =>
	`<${createHash('sha256').update(factKey).digest('hex').slice(0, 40)}@${new URL(env().origin).hostname}>`;
