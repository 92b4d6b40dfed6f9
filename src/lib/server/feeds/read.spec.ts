import { randomBytes } from 'node:crypto';
import { beforeEach, describe, expect, it } from 'vitest';
import { useDatabase } from '../../../../tests/support/database';
import {
	acting,
	addMembers,
	addSlot,
	addSpecGym,
	specNow,
	type SpecGym
} from '../../../../tests/support/gym';
import { addDays } from '$lib/domain/calendar/civil-date';
import { book } from '../bookings/book';
import { db, write } from '../db';
import { feeds, slots } from '../db/schema';
import { createFeed, replaceFeed, revokeFeed, type FeedKind } from './create';
import { readFeed } from './read';

const gymFacts = { gymName: 'Ropewalk Strength', origin: 'https://gym.test' };
let place = 0;
/** Each from a place of its own: wrong addresses are counted by place. */
const read = (token: string, { now = specNow, address = `10.0.0.${(place += 1)}` } = {}) =>
	readFeed({ token, address, now }, gymFacts);
const bodyOf = async (token: string) => {
	const feed = await read(token);
	return feed && feed !== 'too-many' ? feed.body : null;
};

describe('a calendar address', () => {
	useDatabase();
	let gym: SpecGym;
	let memberId: number;
	beforeEach(async () => {
		gym = await addSpecGym();
		[memberId] = (await addMembers(1)) as [number];
	});

	async function make(kind: FeedKind = 'member', who = acting(memberId, 'member')) {
		const made = await createFeed(who, { kind, name: 'My phone', now: specNow });
		if (!made.ok) throw new Error(made.refused);
		return made;
	}

	it('carries the classes that its member is in, and no other', async () => {
		const [mine, other] = [await addSlot(gym), await addSlot(gym, { on: '2026-12-03' })];
		await book(acting(memberId), mine, { now: specNow });
		const body = (await bodyOf((await make()).token))!;
		expect(body.match(/^URL[^\r]*classes\/(\d+)/gm)).toHaveLength(1);
		expect(body).toContain(`/classes/${mine}`);
		expect(body).not.toContain(`/classes/${other}`);
	});

	it('reaches two weeks back and 76 days ahead: 90 days', async () => {
		const days = [-15, -14, 0, 75, 76].map((n) => addDays('2026-12-01', n));
		const ids: number[] = [];
		for (const on of days) ids.push(await addSlot(gym, { on }));
		const head = acting(gym.deskId, 'head_coach');
		const body = (await bodyOf((await make('public', head)).token))!;
		expect(ids.map((id) => body.includes(`/classes/${id}\r`))).toEqual([
			false,
			true,
			true,
			true,
			false
		]);
	});

	it('keeps a class that was called off, as cancelled', async () => {
		const slotId = await addSlot(gym);
		await book(acting(memberId), slotId, { now: specNow });
		await write((tx) =>
			tx.update(slots).set({ cancelledAt: specNow, cancelReason: 'Ice', sequence: 1 })
		);
		expect(await bodyOf((await make()).token)).toMatch(/STATUS:CANCELLED/);
	});

	it('is kept as a hash: no row holds the token', async () => {
		const { token } = await make();
		expect(Buffer.from(token, 'base64url')).toHaveLength(32);
		expect(JSON.stringify(await db.select().from(feeds))).not.toContain(token);
	});

	it('ends when it is revoked, and when it is replaced', async () => {
		const first = await make();
		const second = await replaceFeed(acting(memberId, 'member'), first.feedId, { now: specNow });
		expect(await read(first.token)).toBeNull();
		if (!second.ok) throw new Error(second.refused);
		expect(await bodyOf(second.token)).toContain('BEGIN:VCALENDAR');
		await revokeFeed(acting(memberId, 'member'), second.feedId, { now: specNow });
		expect(await read(second.token)).toBeNull();
	});

	it('is nobody else’s to replace or to end', async () => {
		const { feedId } = await make();
		const other = acting(gym.coachId, 'coach');
		expect(await replaceFeed(other, feedId, { now: specNow })).toMatchObject({ ok: false });
		expect(await revokeFeed(other, feedId, { now: specNow })).toMatchObject({ ok: false });
	});

	it('has an ETag that changes with the classes and not with the hour', async () => {
		const { token } = await make();
		const etag = async (now: number) => {
			const feed = await read(token, { now });
			return feed && feed !== 'too-many' ? feed.etag : null;
		};
		const before = await etag(specNow);
		expect(await etag(specNow + 3_600_000)).toBe(before);
		await book(acting(memberId), await addSlot(gym), { now: specNow });
		expect(await etag(specNow)).not.toBe(before);
	});

	it('cannot be guessed: thirty wrong addresses from one place, then that place waits (G21)', async () => {
		const address = '203.0.113.9';
		const { token } = await make();
		const answers = [];
		for (let i = 0; i < 40; i += 1) {
			answers.push(await read(randomBytes(32).toString('base64url'), { address }));
		}
		expect(answers.slice(0, 30)).toEqual(Array.from({ length: 30 }, () => null));
		expect(answers.slice(30)).toEqual(Array.from({ length: 10 }, () => 'too-many'));
		expect(await read(token, { address })).toMatchObject({ body: expect.any(String) as string });
	});
});
