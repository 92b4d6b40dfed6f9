import { json } from '@sveltejs/kit';
import { eq } from 'drizzle-orm';
import { beforeEach, describe, expect, it } from 'vitest';
import { answerOnce } from '../../src/lib/server/api/repeat';
import { book, type Booked } from '../../src/lib/server/bookings/book';
import { db } from '../../src/lib/server/db';
import { bookings, idempotencyKeys, ledgerEntries } from '../../src/lib/server/db/schema';
import { problem } from '../../src/lib/server/refuse';
import { useDatabase } from '../support/database';
import { acting, addMembers, addSlot, addSpecGym, specNow } from '../support/gym';

const answerTo = (booked: Booked | { ok: false; refused: string }) =>
	booked.ok ? json(booked.booking, { status: 201 }) : problem(booked);

describe('a booking that is asked for again with the same key (goal G9)', () => {
	useDatabase();
	let slotId: number;
	let memberId: number;
	beforeEach(async () => {
		const gym = await addSpecGym();
		slotId = await addSlot(gym);
		[memberId] = (await addMembers(1, 10)) as [number];
	});

	const ask = (key: string | null, body: unknown = {}, breakAt?: 'keep' | 'after') =>
		answerOnce(
			{ personId: memberId, key, route: `/api/slots/${slotId}/bookings`, body, now: specNow },
			async (keep) => {
				const booked = await book(acting(memberId), slotId, { now: specNow }, async (tx, one) => {
					await keep(tx, answerTo(one));
					if (breakAt === 'keep') throw new Error('the machine stops');
				});
				if (breakAt === 'after') throw new Error('the line is cut');
				return answerTo(booked);
			}
		);
	const creditsUsed = async () =>
		(await db.select().from(ledgerEntries).where(eq(ledgerEntries.account, 'used'))).reduce(
			(sum, entry) => sum + entry.amount,
			0
		);

	it('acts once for a hundred at the same moment, and answers all of them alike', async () => {
		const answers = await Promise.all(Array.from({ length: 100 }, () => ask('one-tap')));
		const bodies = await Promise.all(answers.map((answer) => answer.text()));
		expect(new Set(answers.map(({ status }) => status))).toEqual(new Set([201]));
		expect(new Set(bodies).size).toBe(1);
		expect(await db.select().from(bookings)).toHaveLength(1);
		expect(await creditsUsed()).toBe(1);
	});

	it('is refused when the body is another', async () => {
		await ask('one-tap');
		const other = await ask('one-tap', { note: 'another' });
		expect(other.status).toBe(409);
		expect(await other.json()).toMatchObject({ code: 'key-reused' });
	});

	it('has its answer although the first one never arrived', async () => {
		await expect(ask('one-tap', {}, 'after')).rejects.toThrow('the line is cut');
		expect((await ask('one-tap')).status).toBe(201);
		expect(await creditsUsed()).toBe(1);
	});

	it('is undone with the answer that could not be kept, and may be asked for again', async () => {
		await expect(ask('one-tap', {}, 'keep')).rejects.toThrow('the machine stops');
		expect(await db.select().from(bookings)).toEqual([]);
		expect(await db.select().from(idempotencyKeys)).toEqual([]);
		expect(await creditsUsed()).toBe(0);
		expect((await ask('one-tap')).status).toBe(201);
	});

	it('is seen to act twice where no key is sent: the second is refused by the booking itself', async () => {
		const [first, second] = [await ask(null), await ask(null)];
		expect([first.status, second.status]).toEqual([201, 409]);
	});
});
