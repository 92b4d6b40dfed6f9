/** Thrown when more wait than the queue takes: the caller answers "try again" instead of growing. */
export class TooManyWaiting extends Error {}

/** Lets `running` of the given steps run at once and `waiting` wait, first come first served. */
export function atMost(running: number, waiting: number) {
	let busy = 0;
	const queue: (() => void)[] = [];

	return async function run<T>(step: () => Promise<T>): Promise<T> {
		if (busy >= running) {
			if (queue.length >= waiting) throw new TooManyWaiting('too many waiting');
			await new Promise<void>((go) => queue.push(go));
		} else {
			busy += 1;
		}
		try {
			return await step();
		} finally {
			const next = queue.shift();
			if (next) next();
			else busy -= 1;
		}
	};
}
