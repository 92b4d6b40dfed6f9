import { randomBytes } from 'node:crypto';
import type { EmailConfig } from '@auth/core/providers/email';
import { and, eq, isNull } from 'drizzle-orm';
import { mailAddress } from '$lib/domain/people/mail-address';
import { db, write } from '../db';
import { people } from '../db/schema';
import { env } from '../env';
import { currentGym } from '../gym/queries';
import { linkLetter } from '../messages/account-letters';
import { queueMessage } from '../messages/queue';
import { linkLastsS } from './links';
import { mayAskForLink } from './limits';
import { returnPath } from './return-path';

/** Auth.js's e-mailed link, sent by our own outbox. */
export function emailProvider({ now }: { now: number }): EmailConfig {
	return {
		id: 'email',
		type: 'email',
		name: 'Email',
		from: env().mailFrom,
		maxAge: linkLastsS,
		generateVerificationToken: () => randomBytes(32).toString('base64url'),
		normalizeIdentifier: (typed) => mailAddress.parse(typed),
		sendVerificationRequest: ({ identifier, token, url }) =>
			mailLink({ email: identifier, token, to: new URL(url).searchParams.get('callbackUrl') }, now)
	};
}

const unsent = { tooMany: '/sign-in?error=too-many-tries', nobody: '/sign-in?sent=1' };
/** Where a request for a link leads when no mail goes out. */
export const linkAnswers = Object.values(unsent);

/**
 * Whether mail goes out. Where it does not, the visitor reads the same answer: who has an
 * account here is nobody's business.
 */
export async function mayReceiveLink(
	email: string | null | undefined,
	address: string
): Promise<boolean | string> {
	if (!email || !(await mayAskForLink(email, address))) return unsent.tooMany;
	return (await findAccount(email)) ? true : unsent.nobody;
}

async function mailLink(
	link: { email: string; token: string; to: string | null },
	now: number
): Promise<void> {
	const person = await findAccount(link.email);
	if (!person) return;
	const to = link.to ? returnPath(link.to.replace(env().origin, ''), '') : '';
	const query = new URLSearchParams({
		token: link.token,
		email: link.email,
		...(to ? { to } : {})
	});
	const gymName = (await currentGym())?.name ?? '';
	const letter = linkLetter({
		name: person.name,
		gymName,
		href: `${env().origin}/sign-in/link?${query}`
	});
	await write((tx) =>
		queueMessage(tx, {
			kind: 'sign-in-link',
			to: link.email,
			personId: person.id,
			factKey: `sign-in-link:${crypto.randomUUID()}`,
			now,
			...letter
		})
	);
}

async function findAccount(email: string): Promise<{ id: number; name: string } | null> {
	const [person] = await db
		.select({ id: people.id, name: people.name })
		.from(people)
		.where(and(eq(people.email, email), isNull(people.disabledAt)));
	return person ?? null;
}
