import { describe, expect, it } from 'vitest';
import { atMost, TooManyWaiting } from './at-most';

describe('steps that wait for each other', () => {
	it('run two at a time, in order, and refuse the one that finds the queue full', async () => {
		const run = atMost(2, 2);
		const order: number[] = [];
		let running = 0;
		let most = 0;
		const step = (i: number) => () => {
			running += 1;
			most = Math.max(most, running);
			order.push(i);
			return new Promise<void>((done) =>
				setTimeout(() => {
					running -= 1;
					done();
				}, 5)
			);
		};
		const all = [0, 1, 2, 3].map((i) => run(step(i)));
		await expect(run(step(4))).rejects.toBeInstanceOf(TooManyWaiting);
		await Promise.all(all);
		expect([most, order]).toEqual([2, [0, 1, 2, 3]]);
	});

	it('go on after one that failed', async () => {
		const run = atMost(1, 5);
		const failing = run(() => Promise.reject(new Error('no')));
		const next = run(() => Promise.resolve('yes'));
		await expect(failing).rejects.toThrow('no');
		expect(await next).toBe('yes');
	});
});
