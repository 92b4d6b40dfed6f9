import { describe, expect, it } from 'vitest';
import { safeForm, safeJson } from './safe-body';

const asked = (body: BodyInit | null, type: string | null) => {
	const request = new Request('http://gym.test/', {
		method: 'POST',
		body,
		...(body instanceof ReadableStream ? { duplex: 'half' } : {})
	} as RequestInit);
	request.headers.delete('content-type');
	if (type) request.headers.set('content-type', type);
	return { request };
};
const statusFrom = (reading: Promise<unknown>) =>
	reading.then(
		() => 200,
		(e: { status: number }) => e.status
	);

describe('reading a body that may be hostile', () => {
	it('reads what a browser sends', async () => {
		const form = await safeForm(asked('a=1&b=2', 'application/x-www-form-urlencoded'));
		expect([...form]).toEqual([
			['a', '1'],
			['b', '2']
		]);
		expect(await safeJson(asked('{"a":[1]}', 'application/json; charset=utf-8'))).toEqual({
			a: [1]
		});
	});

	it('answers 415 to a type it does not take', async () => {
		expect(await statusFrom(safeForm(asked('{}', 'application/json')))).toBe(415);
		expect(await statusFrom(safeForm(asked('a=1', null)))).toBe(415);
		expect(await statusFrom(safeJson(asked('{}', 'text/plain')))).toBe(415);
		expect(await statusFrom(safeJson(asked('{}', 'application/jsonp')))).toBe(415);
	});

	it('answers 400 to broken multipart, broken JSON and nothing at all', async () => {
		const broken = 'multipart/form-data; boundary=x';
		expect(await statusFrom(safeForm(asked('--y\r\nnot a part', broken)))).toBe(400);
		expect(await statusFrom(safeForm(asked('a', 'multipart/form-data')))).toBe(400);
		expect(await statusFrom(safeJson(asked('{"a":', 'application/json')))).toBe(400);
		expect(await statusFrom(safeJson(asked(null, 'application/json')))).toBe(400);
	});

	it('answers 413 to a large body, with or without a stated length', async () => {
		const large = JSON.stringify('x'.repeat(2000));
		expect(await statusFrom(safeJson(asked(large, 'application/json'), 1000))).toBe(413);
		const stream = new ReadableStream<Uint8Array>({
			pull: (c) => c.enqueue(new Uint8Array(600))
		});
		expect(await statusFrom(safeJson(asked(stream, 'application/json'), 1000))).toBe(413);
	});

	it('takes 20 levels and refuses 21 and a hundred thousand', async () => {
		const nested = (n: number) => '['.repeat(n) + '1' + ']'.repeat(n);
		expect(await statusFrom(safeJson(asked(nested(20), 'application/json')))).toBe(200);
		expect(await statusFrom(safeJson(asked(nested(21), 'application/json')))).toBe(400);
		expect(await statusFrom(safeJson(asked(nested(100_000), 'application/json')))).toBe(400);
	});
});
