import { createHash } from 'node:crypto';
import { and, eq } from 'drizzle-orm';
import { refuse } from '$lib/domain/refusal';
import { db, type Tx } from '../db';
import { idempotencyKeys } from '../db/schema';
import { problem } from '../refuse';

type Asked = { personId: number; key: string | null; route: string; body: unknown; now: number };

/** Keeps an answer for the next request with its key, in the transaction that it answers for. */
export type Keep = (tx: Tx, answer: Response) => Promise<void>;

/** Requests under way, so that two at the same moment act once. */
const underWay = new Map<string, Promise<Response>>();

/**
 * Answers a request that carries an Idempotency-Key the same way twice; the key with another body
 * is refused. `answer` gives its answer to `keep` inside the transaction that acts, so that either
 * both last or neither. Without a key it simply answers. Faults are not kept: they may be tried again.
 */
export async function answerOnce(
	asked: Asked,
	answer: (keep: Keep) => Promise<Response>
): Promise<Response> {
	const { key, personId } = asked;
	if (key === null) return answer(async () => undefined);
	if (!/^[\x21-\x7e]{1,200}$/.test(key)) return problem({ code: 'bad-key', status: 400 });
	const name = `${personId} ${key}`;
	const before = underWay.get(name);
	const turn = (before ?? Promise.resolve())
		.catch(() => undefined)
		.then(() => once(asked, key, answer));
	underWay.set(name, turn);
	try {
		return await turn;
	} finally {
		if (underWay.get(name) === turn) underWay.delete(name);
	}
}

async function once(
	asked: Asked,
	key: string,
	answer: (keep: Keep) => Promise<Response>
): Promise<Response> {
	const { personId, route, now } = asked;
	const bodyHash = createHash('sha256').update(JSON.stringify(asked.body)).digest('hex');
	const [kept] = await db
		.select()
		.from(idempotencyKeys)
		.where(and(eq(idempotencyKeys.personId, personId), eq(idempotencyKeys.key, key)));
	if (kept) {
		const same = kept.route === route && kept.bodyHash === bodyHash;
		return same ? again(kept.status, kept.answer) : problem(refuse('key-reused'));
	}
	return answer(async (tx, given) => {
		await tx.insert(idempotencyKeys).values({
			personId,
			key,
			route,
			bodyHash,
			status: given.status,
			answer: await given.clone().text(),
			createdAt: now
		});
	});
}

const again = (status: number, body: string) =>
	new Response(body, {
		status,
		headers: {
			'content-type': status < 400 ? 'application/json' : 'application/problem+json',
			'idempotent-replay': 'true'
		}
	});
