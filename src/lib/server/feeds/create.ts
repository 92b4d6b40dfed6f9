import { and, eq, isNull, sql } from 'drizzle-orm';
import { refuse, type Refused } from '$lib/domain/refusal';
import { audit } from '../audit/record';
import { write, type Tx } from '../db';
import { feeds } from '../db/schema';
import type { Viewer } from '../guard';
import { hashOf, newToken } from './token';

export type FeedKind = 'member' | 'coach' | 'public';
type Made = { ok: true; feedId: number; token: string };
type Actor = Pick<Viewer, 'personId' | 'capabilities'>;

/** A person has this many calendar addresses at most. */
const mostFeeds = 20;

/** Makes a calendar address, one for each device; its token is told this once. */
export function createFeed(
	viewer: Actor,
	{ kind, name, now }: { kind: FeedKind; name: string; now: number }
): Promise<Made | Refused<'not-allowed' | 'too-many-feeds'>> {
	return write(async (tx) => {
		if (kind === 'coach' && !viewer.capabilities.has('floor:read-own'))
			return refuse('not-allowed');
		if (kind === 'public' && !viewer.capabilities.has('schedule:write'))
			return refuse('not-allowed');
		const own = and(eq(feeds.createdById, viewer.personId), isNull(feeds.revokedAt));
		const [count] = await tx
			.select({ n: sql<number>`count(*)` })
			.from(feeds)
			.where(own);
		if (count!.n >= mostFeeds) return refuse('too-many-feeds');
		return insertFeed(tx, viewer, { kind, name, now });
	});
}

/** Gives a device a new address and ends the old one in the same moment. */
export function replaceFeed(
	viewer: Actor,
	feedId: number,
	{ now }: { now: number }
): Promise<Made | Refused<'not-found'>> {
	return write(async (tx) => {
		const old = await endFeed(tx, viewer, feedId, now);
		return old
			? insertFeed(tx, viewer, { kind: old.kind, name: old.name, now })
			: refuse('not-found');
	});
}

/** Ends an address: its next reading finds nothing. */
export function revokeFeed(
	viewer: Actor,
	feedId: number,
	{ now }: { now: number }
): Promise<{ ok: true } | Refused<'not-found'>> {
	return write(async (tx) =>
		(await endFeed(tx, viewer, feedId, now)) ? { ok: true } : refuse('not-found')
	);
}

async function insertFeed(
	tx: Tx,
	viewer: Actor,
	{ kind, name, now }: { kind: FeedKind; name: string; now: number }
): Promise<Made> {
	const token = newToken();
	const personId = kind === 'public' ? null : viewer.personId;
	const [row] = await tx
		.insert(feeds)
		.values({
			kind,
			name,
			personId,
			tokenHash: hashOf(token),
			createdAt: now,
			createdById: viewer.personId
		})
		.returning({ id: feeds.id });
	if (kind === 'public') {
		await audit(tx, {
			viewer,
			verb: 'feeds.create',
			noun: 'feeds',
			nounId: row!.id,
			now,
			detail: { name }
		});
	}
	return { ok: true, feedId: row!.id, token };
}

async function endFeed(tx: Tx, viewer: Actor, feedId: number, now: number) {
	const [ended] = await tx
		.update(feeds)
		.set({ revokedAt: now })
		.where(
			and(eq(feeds.id, feedId), eq(feeds.createdById, viewer.personId), isNull(feeds.revokedAt))
		)
		.returning({ kind: feeds.kind, name: feeds.name });
	return ended ?? null;
}
