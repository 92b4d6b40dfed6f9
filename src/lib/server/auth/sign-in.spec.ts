import { eq } from 'drizzle-orm';
import { describe, expect, it } from 'vitest';
import { useDatabase } from '../../../../tests/support/database';
import { addPerson, testPassword } from '../../../../tests/support/people';
import { db, write } from '../db';
import { people, signInLinks, signIns } from '../db/schema';
import { checkPassword } from './check-password';
import { keepLink, linkLastsS, useLink } from './links';
import { findSignIn } from './queries';
import { recordSignIn } from './record-sign-in';
import { signOutEverywhere } from './revoke';
import { verifyEmail } from './verify-email';

const now = 1_800_000_000_000;
const device = { userAgent: 'a phone', address: '127.0.0.1' };
const refusedAs = (refused: string) => ({ ok: false, refused });

describe('a password', () => {
	useDatabase();

	it('opens its own account, and no other says why it does not', async () => {
		const id = await addPerson('a@gym.test', ['member']);
		const shut = await addPerson('shut@gym.test', ['member']);
		await write((tx) => tx.update(people).set({ disabledAt: now }).where(eq(people.id, shut)));
		expect(await checkPassword('a@gym.test', testPassword, '1')).toEqual({
			ok: true,
			personId: id
		});
		for (const [email, password] of [
			['a@gym.test', 'wrong'],
			['nobody@gym.test', testPassword],
			['shut@gym.test', testPassword],
			['', testPassword],
			['a@gym.test', 'x'.repeat(201)]
		] as const) {
			expect(await checkPassword(email, password, '1')).toEqual(refusedAs('wrong-password'));
		}
	});

	it('may be guessed ten times in a quarter of an hour, from wherever, and at once', async () => {
		await addPerson('b@gym.test', ['member']);
		const answers = await Promise.all(
			Array.from({ length: 30 }, (_, i) => checkPassword('b@gym.test', 'wrong', `address-${i}`))
		);
		const counted = answers.map((a) => (a.ok ? 'in' : a.refused));
		expect(counted.filter((a) => a === 'wrong-password')).toHaveLength(10);
		expect(counted.filter((a) => a === 'too-many-tries')).toHaveLength(20);
		expect(await checkPassword('b@gym.test', testPassword, 'home')).toEqual(
			refusedAs('too-many-tries')
		);
	});

	it('never counts a success: a whole gym signs in from one address', async () => {
		await addPerson('c@gym.test', ['member']);
		for (let i = 0; i < 120; i += 1) {
			expect((await checkPassword('c@gym.test', testPassword, 'the gym')).ok).toBe(true);
		}
	}, 60_000);

	it('takes as long to refuse for nobody as for somebody', async () => {
		await addPerson('d@gym.test', ['member']);
		const time = async (email: string) => {
			const started = performance.now();
			for (let i = 0; i < 4; i += 1) await checkPassword(email, 'wrong', 'timing');
			return performance.now() - started;
		};
		await time('warm@gym.test');
		const somebody = await time('d@gym.test');
		const nobody = await time('nobody-at-all@gym.test');
		// Two cores shared with other tests: the hash itself, not a few per cent, is what is told apart.
		expect(nobody / somebody).toBeGreaterThan(0.5);
		expect(nobody / somebody).toBeLessThan(2);
	});
});

describe('a sign-in', () => {
	useDatabase();

	it('has a new id each time and ends the one that the browser held', async () => {
		const personId = await addPerson('a@gym.test', ['coach', 'member']);
		const first = await recordSignIn(personId, device, { now, replaces: null });
		const second = await recordSignIn(personId, device, { now: now + 5, replaces: first });
		expect(second).not.toBe(first);
		expect(await findSignIn(first)).toMatchObject({ revokedAt: now + 5 });
		expect(await findSignIn(second)).toMatchObject({
			personId,
			revokedAt: null,
			expiresAt: now + 5 + 12 * 3_600_000,
			roles: expect.arrayContaining(['coach', 'member'])
		});
	});

	it('ends on every device at once, and on nobody else’s', async () => {
		const mine = await addPerson('a@gym.test', ['member']);
		const other = await addPerson('b@gym.test', ['member']);
		for (const person of [mine, mine, other]) {
			await recordSignIn(person, device, { now, replaces: null });
		}
		await signOutEverywhere({ personId: mine }, { now: now + 1 });
		const live = (await db.select().from(signIns)).filter((row) => row.revokedAt === null);
		expect(live.map((row) => row.personId)).toEqual([other]);
	});
});

describe('an e-mailed link', () => {
	useDatabase();
	const link = (token: string) => ({
		identifier: 'a@gym.test',
		token,
		expires: new Date(now + linkLastsS * 1000)
	});

	const unproved = async (email: string) => {
		const id = await addPerson(email, ['member']);
		await write((tx) => tx.update(people).set({ emailVerifiedAt: null }).where(eq(people.id, id)));
		return id;
	};

	it('works once, also when it is followed twice at the same time', async () => {
		await keepLink(link('one'), now);
		const followed = await Promise.all([
			useLink('a@gym.test', 'one', now + 1),
			useLink('a@gym.test', 'one', now + 1)
		]);
		expect(followed.filter(Boolean)).toHaveLength(1);
		expect(await useLink('a@gym.test', 'one', now + 2)).toBeNull();
	});

	it('works until 20 minutes are over, for its own address, and is not kept in plain words', async () => {
		await keepLink(link('two'), now);
		expect((await db.select().from(signInLinks))[0]?.tokenHash).not.toContain('two');
		expect(await useLink('b@gym.test', 'two', now + 1)).toBeNull();
		expect(await useLink('a@gym.test', 'two', now + 20 * 60_000 - 1)).not.toBeNull();
		await keepLink(link('three'), now);
		expect(await useLink('a@gym.test', 'three', now + 20 * 60_000)).toBeNull();
		expect(await db.select().from(signInLinks)).toEqual([]);
	});

	it('ends a password and sign-ins that somebody else set up on the address before', async () => {
		const personId = await unproved('a@gym.test');
		const theirs = await recordSignIn(personId, device, { now, replaces: null });
		await verifyEmail(personId, { now: now + 1, signedInAs: null });
		const [row] = await db.select().from(people).where(eq(people.id, personId));
		expect(row).toMatchObject({ passwordHash: null, emailVerifiedAt: now + 1 });
		expect(await findSignIn(theirs)).toMatchObject({ revokedAt: now + 1 });
	});

	it('keeps the password of whoever opens it while signed in, and of an address proved before', async () => {
		const personId = await unproved('a@gym.test');
		await verifyEmail(personId, { now: now + 1, signedInAs: personId });
		await verifyEmail(personId, { now: now + 2, signedInAs: null });
		const [row] = await db.select().from(people).where(eq(people.id, personId));
		expect(row?.passwordHash).not.toBeNull();
		expect(row?.emailVerifiedAt).toBe(now + 1);
	});
});
