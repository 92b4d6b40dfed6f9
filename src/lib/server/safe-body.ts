import { error, type RequestEvent } from '@sveltejs/kit';
import { refusalSentence } from '$lib/wording/refusals';
import { statusOf } from './refuse';

type Asked = Pick<RequestEvent, 'request'>;

/** Bytes; forms and API bodies are small, uploads ask for more by name. */
const usualLimit = 256 * 1024;
/** Bytes of a refused body that are read and forgotten before its connection is given up. */
const mostDiscarded = 16 * 1024 * 1024;
/** Levels of arrays and objects in a JSON body; our own deepest is under ten. */
const deepest = 20;

/** Reads a form body. A wrong type is 415, a broken one 400, a large one 413: never a crash. */
export async function safeForm(event: Asked, limit = usualLimit): Promise<FormData> {
	const type = event.request.headers.get('content-type') ?? '';
	if (!/^(multipart\/form-data|application\/x-www-form-urlencoded)\b/i.test(type)) {
		refuseBody('wrong-body-type');
	}
	const bytes = await readBytes(event.request, limit);
	try {
		return await new Response(bytes, { headers: { 'content-type': type } }).formData();
	} catch {
		refuseBody('bad-body');
	}
}

/** Reads a body as it was sent, for who checks a signature over it. */
export async function safeText(event: Asked, limit = usualLimit): Promise<string> {
	return new TextDecoder().decode(await readBytes(event.request, limit));
}

/** Reads a JSON body; what comes back is unchecked, for a zod schema to read. */
export async function safeJson(event: Asked, limit = usualLimit): Promise<unknown> {
	const type = event.request.headers.get('content-type') ?? '';
	if (!/^application\/json\b/i.test(type)) refuseBody('wrong-body-type');
	const bytes = await readBytes(event.request, limit);
	const value = parseJson(new TextDecoder().decode(bytes));
	if (isDeeperThan(value, deepest)) refuseBody('too-deep');
	return value;
}

/** Counts while reading, so that a body without a stated length is held to the limit too. */
async function readBytes(request: Request, limit: number): Promise<Uint8Array<ArrayBuffer>> {
	if (Number(request.headers.get('content-length')) > limit) refuseBody('body-too-large');
	const chunks: Uint8Array[] = [];
	let size = 0;
	const reader = request.body?.getReader();
	while (reader) {
		const { done, value } = await reader.read().catch(brokenOff);
		if (done) break;
		size += value.byteLength;
		if (size > limit) {
			void discard(reader);
			refuseBody('body-too-large');
		}
		chunks.push(value);
	}
	return new Uint8Array(Buffer.concat(chunks, size));
}

/**
 * Reads and forgets a body that nobody asked for. Left alone, it is cancelled when the request
 * is collected as garbage, which cuts a connection that may serve another request by then.
 */
export function discardBody({ request }: Asked): void {
	if (request.body && !request.body.locked && !request.bodyUsed) {
		void discard(request.body.getReader());
	}
}

async function discard(reader: ReadableStreamDefaultReader<Uint8Array>): Promise<void> {
	try {
		for (let left = mostDiscarded; left > 0;) {
			const { done, value } = await reader.read();
			if (done) return;
			left -= value.byteLength;
		}
		await reader.cancel();
	} catch {
		// The adapter's limit ended it, or the client went away: there is nothing left to read.
	}
}

/** The adapter's own limit arrives as an error of the stream with a status. */
function brokenOff(cause: unknown): never {
	const tooLarge = cause instanceof Error && 'status' in cause && cause.status === 413;
	refuseBody(tooLarge ? 'body-too-large' : 'bad-body');
}

function parseJson(text: string): unknown {
	try {
		return JSON.parse(text);
	} catch {
		refuseBody('bad-body');
	}
}

/** Walks level by level, without recursion that a hostile body could exhaust. */
function isDeeperThan(value: unknown, limit: number): boolean {
	let level = nesting([value]);
	for (let depth = 0; depth < limit; depth += 1) {
		level = nesting(level.flatMap((v) => Object.values(v)));
	}
	return level.length > 0;
}

const nesting = (values: unknown[]) =>
	values.filter((v): v is object => v !== null && typeof v === 'object');

function refuseBody(code: string): never {
	error(statusOf(code), { message: refusalSentence(code), code });
}
