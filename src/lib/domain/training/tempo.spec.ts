import { describe, expect, it } from 'vitest';
import values from '../../../../tests/support/check-values/tempo.json';
import { parseTempo, repSeconds, setSeconds, tempoSaid } from './tempo';

const read = (text: string) => {
	const result = parseTempo(text);
	if (!result.ok) throw new Error(`${text} was refused`);
	return result.tempo;
};

describe('tempo', () => {
	// Each row's source is its own `source`: trade notation; X counts 1 s (common practice, no source).
	it.each(values.rows)('$tempo takes $secondsPerRep s a rep', ({ tempo, secondsPerRep, set8 }) => {
		expect(repSeconds(read(tempo))).toBe(secondsPerRep);
		expect(setSeconds(read(tempo), 8)).toBe(set8);
	});

	it.each([...values.invalid, '4-0-X-1', '40x1', '40X11', ' 40X1', '4٠X1'])(
		'"%s" is not a tempo',
		(text) => {
			expect(parseTempo(text)).toMatchObject({ ok: false, refused: 'tempo-unreadable' });
		}
	);

	it('is shown with its four figures apart, the lowering first', () => {
		expect(tempoSaid(read('40X1'))).toBe('4-0-X-1');
		expect(read('5000')).toEqual([5, 0, 0, 0]);
	});
});
