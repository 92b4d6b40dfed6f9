import { simpleParser, type ParsedMail } from 'mailparser';
import { SMTPServer, type SMTPServerDataStream, type SMTPServerSession } from 'smtp-server';
import type { Mailbox } from './mailbox';

/** Takes any mail without a password and without encryption, and keeps it. */
export function createSmtp(mailbox: Mailbox): SMTPServer {
	const smtp = new SMTPServer({
		authOptional: true,
		disabledCommands: ['STARTTLS', 'AUTH'],
		disableReverseLookup: true,
		size: 1024 * 1024,
		onData(stream, envelope, done) {
			receive(stream, envelope, mailbox).then(
				() => done(),
				(error: Error) => done(error)
			);
		}
	});
	// A client that hangs up in the middle is reported as an error of the server.
	smtp.on('error', () => undefined);
	return smtp;
}

async function receive(
	stream: SMTPServerDataStream,
	envelope: SMTPServerSession,
	mailbox: Mailbox
): Promise<void> {
	const mail = await simpleParser(stream);
	mailbox.add({
		receivedAt: new Date(),
		to: envelope.envelope.rcptTo.map((to) => to.address),
		from: mail.from?.text ?? '',
		subject: mail.subject ?? '',
		text: mail.text ?? '',
		html: mail.html || null,
		messageId: mail.messageId ?? '',
		attachments: attachmentsOf(mail)
	});
}

const attachmentsOf = (mail: ParsedMail) =>
	mail.attachments.map((part, i) => ({
		name: part.filename ?? `part-${i + 1}`,
		type: part.contentType,
		content: part.content
	}));
