import { describe, expect, it } from 'vitest';
import { isWeakPassword } from './password';

const own = ['Sorcha Ní Fhloinn', 'sorcha@ropewalk.example', 'Ropewalk Strength'];

describe('passwords that anybody would guess', () => {
	it.each([
		'Password123!',
		'1234567890',
		'9876543210',
		'abcdefghijkl',
		'aaaaaaaaaaaa',
		'abababababab',
		'qwertyuiop12',
		'Sorcha2026',
		'ropewalk1234',
		'1q2w3e4r5t'
	])('refuses %s', (password) => {
		expect(isWeakPassword(password, own)).toBe(true);
	});

	it.each(['ropewalk-demo', 'four bells on the loft', 'T7#kkp2!vvQ', 'sorcha likes rowing'])(
		'takes %s',
		(password) => {
			expect(isWeakPassword(password, own)).toBe(false);
		}
	);
});
