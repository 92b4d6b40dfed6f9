import { createServer } from 'node:http';
import { answerInbox } from './page';
import { createMailbox } from './mailbox';
import { createSmtp } from './smtp';

export type MailFake = { url: string; pageUrl: string; stop: () => Promise<void> };

/** A mail server and its inbox page, on this machine alone. Ports of 0 are any free ones. */
export async function startMailFake(ports: {
	pagePort: number;
	smtpPort: number;
}): Promise<MailFake> {
	const mailbox = createMailbox();
	const smtp = createSmtp(mailbox);
	const page = createServer((request, response) => answerInbox(mailbox, request, response));
	const smtpPort = await listening(smtp.server, ports.smtpPort);
	const pagePort = await listening(page, ports.pagePort);
	return {
		url: `smtp://127.0.0.1:${smtpPort}`,
		pageUrl: `http://localhost:${pagePort}`,
		stop: async () => {
			page.closeAllConnections();
			await Promise.all([new Promise((done) => smtp.close(() => done(null))), closed(page)]);
		}
	};
}

type Listener = {
	listen(port: number, host: string, done: () => void): unknown;
	once(name: 'error', then: (error: Error) => void): unknown;
	address(): string | { port: number } | null;
	close(done: () => void): unknown;
};

const listening = (server: Listener, port: number) =>
	new Promise<number>((done, failed) => {
		server.once('error', failed);
		server.listen(port, '127.0.0.1', () => {
			const at = server.address();
			done(at && typeof at === 'object' ? at.port : port);
		});
	});

const closed = (server: Listener) => new Promise<void>((done) => server.close(done));
