import type { IncomingMessage, ServerResponse } from 'node:http';
import type { Mail, Mailbox } from './mailbox';
import { inboxPage, mailPage, messageDocument } from './pages';

/**
 * The inbox page: `/` the list, `/mails/1` one mail, `/mails/1/body` its HTML for a sandboxed
 * frame, and `/api/mails?to=` the same as JSON for tests.
 */
export function answerInbox(mailbox: Mailbox, request: IncomingMessage, response: ServerResponse) {
	const url = new URL(request.url ?? '/', 'http://inbox');
	if (request.method !== 'GET') return send(response, 405, 'text/plain', 'Only GET here');
	if (url.pathname === '/') return html(response, inboxPage(mailbox.all()));
	if (url.pathname === '/api/mails') {
		const mails = mailbox.all(url.searchParams.get('to') ?? undefined).map(asJson);
		return send(response, 200, 'application/json', JSON.stringify({ mails }));
	}
	const [, id, part, index] =
		/^\/mails\/(\d{1,9})(?:\/(body|attachments\/(\d{1,3})))?$/.exec(url.pathname) ?? [];
	const mail = id ? mailbox.find(Number(id)) : undefined;
	if (!mail) return send(response, 404, 'text/plain', 'No such mail');
	if (part === 'body') return html(response, messageDocument(mail), framePolicy);
	if (index !== undefined) return attachment(response, mail, Number(index));
	return html(response, mailPage(mail));
}

const pagePolicy =
	"default-src 'none'; style-src 'unsafe-inline'; frame-src 'self'; base-uri 'none'; form-action 'none'; frame-ancestors 'none'";
/** Mail is hostile: no script, no outside address; links open in a tab of their own. */
const framePolicy =
	"default-src 'none'; style-src 'unsafe-inline'; img-src data:; base-uri 'none'; form-action 'none'; frame-ancestors 'self'; sandbox allow-popups allow-popups-to-escape-sandbox";

const html = (response: ServerResponse, body: string, policy = pagePolicy) =>
	send(response, 200, 'text/html; charset=utf-8', body, policy);

function attachment(response: ServerResponse, mail: Mail, index: number) {
	const part = mail.attachments[index];
	if (!part) return send(response, 404, 'text/plain', 'No such part');
	response.setHeader('content-disposition', 'attachment');
	send(response, 200, 'application/octet-stream', part.content);
}

function send(
	response: ServerResponse,
	status: number,
	type: string,
	body: string | Buffer,
	policy = pagePolicy
): void {
	response.writeHead(status, {
		'content-type': type,
		'content-security-policy': policy,
		'x-content-type-options': 'nosniff',
		'referrer-policy': 'no-referrer',
		'cache-control': 'no-store'
	});
	response.end(body);
}

const asJson = ({ attachments, ...mail }: Mail) => ({
	...mail,
	attachments: attachments.map(({ name, type, content }) => ({ name, type, bytes: content.length }))
});
