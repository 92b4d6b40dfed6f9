import { describe, expect, it } from 'vitest';
import { sessionFaults } from '$lib/domain/training';
import { dropWords } from './drop-words';
import { faultSentence } from './session-faults';

describe('faults of a session in words', () => {
	it.each([...sessionFaults, 'too-big', 'too-small', 'invalid-type', 'unrecognized-keys'])(
		'%s has a sentence of its own',
		(code) => {
			expect(faultSentence(code)).not.toContain('(');
			expect(faultSentence(code)).not.toBe('');
		}
	);

	it('names a fault that nobody foresaw by its code', () => {
		expect(faultSentence('something-new')).toBe('Something is off here (something-new).');
	});
});

describe('a drop rule in words', () => {
	// Common practice, no source.
	it('says the variation, and what to do without its kit', () => {
		const note = 'No band free: lower for 3 to 6 s, 5 reps.';
		expect(dropWords({ belowReps: 5, toName: 'Banded pull-up', note })).toBe(
			'Below 5 reps, go on with: Banded pull-up. No band free: lower for 3 to 6 s, 5 reps.'
		);
	});

	it('ends the set where nothing easier is left', () => {
		expect(dropWords({ belowReps: 5, toName: null, note: null })).toBe(
			'Below 5 reps, end the set.'
		);
	});
});
