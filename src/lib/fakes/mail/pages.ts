import type { Mail } from './mailbox';

/** The list of what arrived, newest first. */
export function inboxPage(mails: Mail[]): string {
	const rows = mails.map(
		(mail) =>
			`<li><a href="/mails/${mail.id}"><span class="to">${escapeHtml(mail.to.join(', '))}</span><span class="subject">${escapeHtml(mail.subject)}</span><time>${clock(mail)}</time></a></li>`
	);
	return page(
		'Inbox',
		`<h1>Inbox</h1><p class="muted">Mail that this gym sent, kept on this machine. Nothing leaves it.</p>${
			rows.length > 0 ? `<ol>${rows.join('')}</ol>` : '<p class="empty">No mail yet.</p>'
		}`
	);
}

export function mailPage(mail: Mail): string {
	const parts = mail.attachments.map(
		(part, i) =>
			`<li><a href="/mails/${mail.id}/attachments/${i}">${escapeHtml(part.name)}, ${escapeHtml(part.type)}</a></li>`
	);
	return page(
		mail.subject,
		`<p><a href="/">Inbox</a></p><h1>${escapeHtml(mail.subject)}</h1><p class="muted">To ${escapeHtml(mail.to.join(', '))}, from ${escapeHtml(mail.from)}, ${clock(mail)}</p>${
			mail.html === null
				? ''
				: `<iframe title="The mail as it looks" src="/mails/${mail.id}/body" sandbox="allow-popups allow-popups-to-escape-sandbox"></iframe>`
		}<h2>As plain text</h2><pre>${withLinks(mail.text)}</pre>${
			parts.length > 0 ? `<h2>Attached</h2><ul>${parts.join('')}</ul>` : ''
		}`
	);
}

/** The mail's own HTML, for the frame; its links leave the frame. */
export function messageDocument(mail: Mail): string {
	return `<base target="_blank">${mail.html ?? ''}`;
}

/** Web addresses become links; everything else stays text. */
const withLinks = (text: string) =>
	escapeHtml(text).replace(
		/https?:\/\/[^\s<>"']+/g,
		(address) => `<a href="${address}">${address}</a>`
	);

const clock = (mail: Mail) => mail.receivedAt.toISOString().slice(11, 19);

const entities: Record<string, string> = {
	'&': '&amp;',
	'<': '&lt;',
	'>': '&gt;',
	'"': '&quot;',
	"'": '&#39;'
};
const escapeHtml = (text: string) => text.replace(/[&<>"']/g, (c) => entities[c] ?? c);

const page = (title: string, body: string) => `<!doctype html>
<html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width"><title>${escapeHtml(title)}</title><style>
:root{color-scheme:light dark;--bg:#F4F2EC;--surface:#FFF;--ink:#17201C;--muted:#55625B;--line:#DAD7CC;--pine:#1E5545}
@media (prefers-color-scheme:dark){:root{--bg:#101613;--surface:#19211D;--ink:#ECEFE9;--muted:#A0ADA5;--line:#2C3731;--pine:#8AD3B6}}
body{margin:0;padding:32px 20px;background:var(--bg);color:var(--ink);font:15px/22px system-ui,sans-serif}
main{max-width:760px;margin:0 auto}h1{font-size:28px;line-height:34px;margin:0 0 8px}h2{font-size:16px;margin:24px 0 8px}
a{color:var(--pine)}.muted{color:var(--muted);margin:0 0 20px}.empty{padding:32px;border:1px dashed var(--muted);border-radius:14px;text-align:center}
ol{list-style:none;margin:0;padding:0;background:var(--surface);border-radius:14px}li+li{border-top:1px solid var(--line)}
ol a{display:grid;grid-template-columns:minmax(0,15rem) 1fr auto;gap:16px;padding:14px 18px;color:inherit;text-decoration:none}ol a:hover .subject{text-decoration:underline}
.to{color:var(--muted);overflow:hidden;text-overflow:ellipsis}.subject{font-weight:600}time{color:var(--muted)}
iframe{width:100%;height:460px;border:1px solid var(--line);border-radius:14px;background:#FFF}
pre{white-space:pre-wrap;overflow-wrap:anywhere;padding:16px;background:var(--surface);border-radius:14px;font:13px/20px ui-monospace,monospace}
@media (max-width:560px){ol a{grid-template-columns:1fr auto}.to{grid-column:1/-1}}
</style></head><body><main>${body}</main></body></html>`;
