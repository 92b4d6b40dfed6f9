import { refuse, type Refused } from '../refusal';

/** Seconds of each part of a repetition, in the order lowering, pause, lifting, pause; X is as fast as possible. */
export type TempoPart = number | 'X';
export type Tempo = readonly [TempoPart, TempoPart, TempoPart, TempoPart];

/** How long an X counts, in seconds (common practice, no source). */
const explosiveS = 1;

/**
 * Reads four figures such as "40X1": lowering, pause at the stretch, lifting, pause at the top,
 * each 0 to 9 seconds or X, and the lowering first whatever the lift starts with. Anything else,
 * the display form "4-0-X-1" too, is refused.
 */
export function parseTempo(text: string): { ok: true; tempo: Tempo } | Refused<'tempo-unreadable'> {
	if (!/^[0-9X]{4}$/.test(text)) return refuse('tempo-unreadable', { tempo: text.slice(0, 20) });
	const [lowering, stretch, lifting, top] = [...text].map((figure) =>
		figure === 'X' ? figure : Number(figure)
	) as [TempoPart, TempoPart, TempoPart, TempoPart];
	return { ok: true, tempo: [lowering, stretch, lifting, top] };
}

/** "40X1" as it is shown: "4-0-X-1". */
export const tempoSaid = (tempo: Tempo): string => tempo.join('-');

/** Seconds that one repetition takes: the sum of the four figures. */
export const repSeconds = (tempo: Tempo): number =>
	tempo.reduce<number>((sum, part) => sum + (part === 'X' ? explosiveS : part), 0);

/** Seconds under tension of a set of `reps`. */
export const setSeconds = (tempo: Tempo, reps: number): number => reps * repSeconds(tempo);
