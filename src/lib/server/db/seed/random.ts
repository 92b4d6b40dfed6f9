/** Numbers from 0 to 1 that are the same for the same seed (mulberry32, from memory). */
export function randomFrom(seed: number) {
	let state = seed >>> 0;
	const next = (): number => {
		state = (state + 0x6d2b79f5) >>> 0;
		let t = state;
		t = Math.imul(t ^ (t >>> 15), t | 1);
		t ^= t + Math.imul(t ^ (t >>> 7), t | 61);
		return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
	};
	return {
		next,
		below: (n: number) => Math.floor(next() * n),
		pick: <T>(items: readonly T[]): T => items[Math.floor(next() * items.length)]!,
		/** The items in another order. */
		shuffled: <T>(items: readonly T[]): T[] => {
			const all = [...items];
			for (let i = all.length - 1; i > 0; i -= 1) {
				const j = Math.floor(next() * (i + 1));
				[all[i], all[j]] = [all[j]!, all[i]!];
			}
			return all;
		}
	};
}
export type Random = ReturnType<typeof randomFrom>;
