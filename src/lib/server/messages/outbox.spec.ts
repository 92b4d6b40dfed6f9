import { createServer } from 'node:net';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { startMailFake, type MailFake } from '$lib/fakes/mail/start';
import { useDatabase } from '../../../../tests/support/database';
import { db, write } from '../db';
import { outboxMessages } from '../db/schema';
import { setLetter } from './letter';
import { claimDue } from './outbox';
import { queueMessage, type Message } from './queue';
import { sendDue } from './worker';

const clock = vi.hoisted(() => ({ at: 1_800_000_000_000 }));
vi.mock('../clock', () => ({ now: () => clock.at }));

const letter = setLetter({
	subject: 'You are in',
	greeting: 'Hello Ada,',
	paragraphs: ['Strength <b>tonight</b> & tomorrow.'],
	button: { label: 'See it', href: 'https://gym.test/classes/1?a=1&b=2' },
	gymName: 'Ropewalk'
});
const message = (over: Partial<Message> = {}): Message => ({
	kind: 'promoted',
	to: 'ada@gym.test',
	personId: null,
	factKey: 'booking:1:promoted',
	now: clock.at,
	...letter,
	...over
});
const queue = (over: Partial<Message> = {}) => write((tx) => queueMessage(tx, message(over)));
const rows = () => db.select().from(outboxMessages);

describe('the outbox', () => {
	useDatabase();
	let fake: MailFake;
	const post = () => ({ url: fake.url, from: 'classes@gym.test' });
	const inbox = async () => {
		const answer = await fetch(`${fake.pageUrl.replace('localhost', '127.0.0.1')}/api/mails`);
		return ((await answer.json()) as { mails: Record<string, string>[] }).mails;
	};
	beforeEach(async () => {
		fake = await startMailFake({ pagePort: 0, smtpPort: 0 });
	});
	afterEach(() => fake.stop());

	it('sends what a fact caused, in both forms, once', async () => {
		await queue();
		await queue();
		await sendDue(post());
		await sendDue(post());
		const mails = await inbox();
		expect(mails).toHaveLength(1);
		expect(mails[0]).toMatchObject({ to: ['ada@gym.test'], subject: 'You are in' });
		expect(mails[0]?.text).toContain('https://gym.test/classes/1?a=1&b=2');
		expect(mails[0]?.html).toContain('Strength &lt;b&gt;tonight&lt;/b&gt; &amp; tomorrow.');
		expect((await rows())[0]).toMatchObject({ sentAt: clock.at, claimedAt: null });
	});

	it('keeps one Message-ID a fact, so that a second delivery is recognised', async () => {
		await queue();
		const [before] = await rows();
		await sendDue(post());
		expect((await inbox())[0]?.messageId).toBe(before?.messageId);
		expect(before?.messageId).toMatch(/^<[0-9a-f]{40}@localhost>$/);
	});

	it.each([
		'ada@gym.test, eve@evil.test',
		'ada@gym.test\r\nBcc: eve@evil.test',
		'"ada@gym.test" <eve@evil.test>',
		'ada@gym.test\u0000',
		'ada＠gym.test',
		'@gym.test'
	])('refuses the address %j', async (to) => {
		await expect(queue({ to })).rejects.toThrow();
		expect(await rows()).toEqual([]);
	});

	it('keeps a subject on one line: no second header, no second recipient', async () => {
		await queue({ subject: 'Hi\r\nBcc: eve@evil.test\r\n\r\nbody' });
		await sendDue(post());
		expect(await inbox()).toMatchObject([
			{ to: ['ada@gym.test'], subject: 'Hi Bcc: eve@evil.test body' }
		]);
	});

	it('tries again after 1, 5 and 15 minutes while the server is down, and loses nothing', async () => {
		await queue();
		const down = { ...post(), url: 'smtp://127.0.0.1:1' };
		for (const minutes of [1, 5, 15]) {
			await sendDue(down);
			expect((await rows())[0]).toMatchObject({
				sentAt: null,
				claimedAt: null,
				nextAttemptAt: clock.at + minutes * 60_000
			});
			clock.at += minutes * 60_000 - 1;
			expect(await claimDue(clock.at, 10)).toEqual([]);
			clock.at += 1;
		}
		await sendDue(post());
		expect(await inbox()).toHaveLength(1);
	});

	it('gives up on an address that the server refuses for good', async () => {
		const refusing = await smtpThatSays('550 no such mailbox');
		await queue();
		await sendDue({ ...post(), url: refusing.url });
		expect((await rows())[0]).toMatchObject({ failedAt: clock.at, sentAt: null });
		refusing.stop();
	});

	it('sends again what a process that died had claimed, after two minutes', async () => {
		await queue();
		expect(await claimDue(clock.at, 10)).toHaveLength(1);
		expect(await claimDue(clock.at + 120_000, 10)).toHaveLength(0);
		expect(await claimDue(clock.at + 120_001, 10)).toHaveLength(1);
	});

	it('claims a message for one of two workers only', async () => {
		await queue();
		const claims = await Promise.all([claimDue(clock.at, 10), claimDue(clock.at, 10)]);
		expect(claims.flat()).toHaveLength(1);
	});

	it('shows hostile mail in a sandbox and escaped in the list', async () => {
		await queue({
			subject: '<script>alert(1)</script>',
			html: '<script>alert(1)</script><a href="https://gym.test">x</a>'
		});
		await sendDue(post());
		const page = fake.pageUrl.replace('localhost', '127.0.0.1');
		const list = await (await fetch(page)).text();
		expect(list).not.toContain('<script>');
		expect(list).toContain('&lt;script&gt;');
		const body = await fetch(`${page}/mails/1/body`);
		expect(body.headers.get('content-security-policy')).toMatch(/default-src 'none'.*sandbox/);
		expect(await (await fetch(`${page}/mails/1`)).text()).toMatch(/<iframe[^>]+sandbox=/);
		expect((await fetch(`${page}/mails/2`)).status).toBe(404);
	});
});

async function smtpThatSays(answer: string): Promise<{ url: string; stop: () => void }> {
	const server = createServer((socket) => {
		socket.write('220 here\r\n');
		socket.on('data', (data) => {
			const said = data.toString();
			if (/^(EHLO|HELO|MAIL|RSET)/.test(said)) socket.write('250 ok\r\n');
			else if (said.startsWith('RCPT')) socket.write(`${answer}\r\n`);
			else socket.end('221 bye\r\n');
		});
		socket.on('error', () => undefined);
	});
	await new Promise<void>((up) => server.listen(0, '127.0.0.1', up));
	const { port } = server.address() as { port: number };
	return { url: `smtp://127.0.0.1:${port}`, stop: () => server.close() };
}
