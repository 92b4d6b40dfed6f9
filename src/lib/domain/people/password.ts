/** OWASP ASVS 5.0, 6.2.1 asks for 8 and recommends 15; ours (common practice, no source). */
export const shortestPassword = 10;
export const longestPassword = 200;

/** Long enough and still the first that anybody tries (from memory of published lists). */
const everybodys = [
	'password',
	'qwertyuiop',
	'qwerty',
	'iloveyou',
	'letmein',
	'welcome',
	'asdfghjkl',
	'zxcvbnm',
	'1q2w3e4r5t',
	'abc123',
	'sunshine',
	'football',
	'strength',
	'changeme'
];

/**
 * Whether a password of due length is easily guessed: one of everybody's with figures around
 * it, a few characters over and over, a row of keys or digits, or made of the person's own
 * words (name, address, gym).
 */
export function isWeakPassword(password: string, ownWords: readonly string[]): boolean {
	const plain = password.toLowerCase().replace(/[^a-z0-9]/g, '');
	const letters = withoutOuterFigures(plain);
	if (new Set(password).size < 5) return true;
	if (everybodys.includes(letters) || everybodys.includes(plain)) return true;
	if (isRow(plain)) return true;
	return ownWords
		.flatMap((words) => words.toLowerCase().split(/[^a-z0-9]+/))
		.some((word) => word.length >= 3 && plain.replaceAll(word, '').replace(/\d/g, '').length < 3);
}

const row = '01234567890123456789abcdefghijklmnopqrstuvwxyz';
const isRow = (text: string) =>
	text.length > 3 && (row.includes(text) || row.includes([...text].reverse().join('')));

/** By hand: the expression for it takes quadratic time on a long row of figures. */
function withoutOuterFigures(plain: string): string {
	const isLetter = (character: string) => character > '9';
	const characters = [...plain];
	return characters
		.slice(characters.findIndex(isLetter), characters.findLastIndex(isLetter) + 1)
		.join('');
}
