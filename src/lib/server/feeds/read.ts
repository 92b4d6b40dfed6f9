import { createHash } from 'node:crypto';
import { RateLimiterMemory } from 'rate-limiter-flexible';
import { writeCalendar } from './calendar';
import { entriesOf, feedByToken, noteReading } from './queries';

/** Wrong addresses in an hour from one place, before it is told to wait; readers of right ones are never counted. */
const misses = new RateLimiterMemory({ points: 30, duration: 3600 });

const dayMs = 86_400_000;
/** A window of 90 days: two weeks behind, the rest ahead. */
const behindMs = 14 * dayMs;
const aheadMs = 76 * dayMs;

type Asked = { token: string; address: string; now: number };

/** The calendar behind a token, with the ETag of its text; null where there is none. */
export async function readFeed(
	{ token, address, now }: Asked,
	gym: { gymName: string; origin: string }
): Promise<{ body: string; etag: string } | null | 'too-many'> {
	const missed = await misses.get(address);
	const feed = /^[\w-]{43}$/.test(token) ? await feedByToken(token) : null;
	if (!feed) {
		if (missed && missed.remainingPoints <= 0) return 'too-many';
		await misses.penalty(address);
		return null;
	}
	await noteReading(feed, now);
	const today = Math.floor(now / dayMs) * dayMs;
	const entries = await entriesOf(feed, today - behindMs, today + aheadMs);
	const { origin, gymName } = gym;
	const body = writeCalendar(entries, { name: gymName, origin, host: new URL(origin).hostname });
	const etag = `"${createHash('sha256').update(body).digest('base64url').slice(0, 32)}"`;
	return { body, etag };
}
