import * as m from '$lib/wording/compiled/messages';
import type { Letter } from './queue';

export type Draft = {
	subject: string;
	greeting: string;
	paragraphs: string[];
	/** The one thing to do, with a whole address. */
	button?: { label: string; href: string };
	/** Small print below the button. */
	notes?: string[];
	gymName: string;
};

/** Sets a draft as plain text and as HTML that needs nothing from outside. */
export function setLetter(draft: Draft): Letter {
	return { subject: draft.subject, text: asText(draft), html: asHtml(draft) };
}

function asText({ greeting, paragraphs, button, notes = [], gymName }: Draft): string {
	const link = button ? [`${button.label}:\n${button.href}`] : [];
	return [
		greeting,
		...paragraphs,
		...link,
		...notes,
		`${gymName}\n${m.account_mail_sent_by()}`
	].join('\n\n');
}

function asHtml({ subject, greeting, paragraphs, button, notes = [], gymName }: Draft): string {
	const p = (text: string, style = '') =>
		`<p style="margin:0 0 16px;${style}">${escapeHtml(text)}</p>`;
	const link = button
		? `<p style="margin:24px 0"><a href="${escapeHtml(button.href)}" style="display:inline-block;padding:14px 24px;border-radius:10px;background:#1E5545;color:#FFFFFF;text-decoration:none;font-weight:600">${escapeHtml(button.label)}</a></p>`
		: '';
	return `<!doctype html><html lang="en"><head><meta charset="utf-8"><title>${escapeHtml(subject)}</title></head><body style="margin:0;padding:24px;background:#F4F2EC;color:#17201C;font:16px/24px system-ui,sans-serif"><div style="max-width:520px;margin:0 auto;padding:28px;border-radius:14px;background:#FFFFFF">${[
		p(greeting, 'font-weight:600'),
		...paragraphs.map((text) => p(text)),
		link,
		...notes.map((text) => p(text, 'font-size:14px;line-height:20px;color:#55625B'))
	].join(
		''
	)}</div><p style="max-width:520px;margin:16px auto 0;font-size:13px;color:#55625B">${escapeHtml(gymName)}. ${escapeHtml(m.account_mail_sent_by())}</p></body></html>`;
}

const entities: Record<string, string> = {
	'&': '&amp;',
	'<': '&lt;',
	'>': '&gt;',
	'"': '&quot;',
	"'": '&#39;'
};
const escapeHtml = (text: string) => text.replace(/[&<>"']/g, (c) => entities[c] ?? c);
