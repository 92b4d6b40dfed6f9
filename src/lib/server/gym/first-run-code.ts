import { createHash, randomInt, timingSafeEqual } from 'node:crypto';

/** Without letters and figures that look alike on a terminal. */
const letters = 'ABCDEFGHJKMNPQRSTUVWXYZ23456789';

let code: string | null = null;

/** Makes the code that opens the first-run page and prints it where only the host's owner reads. */
export function announceFirstRun(): void {
	code = Array.from({ length: 12 }, () => letters[randomInt(letters.length)]).join('');
	const shown = code.replace(/(.{4})(?=.)/g, '$1-');
	process.stdout.write(`kithour: no gym yet. Open /first-run and enter the code ${shown}\n`);
}

/** Case, spaces and dashes as typed do not matter. */
export function isFirstRunCode(typed: string): boolean {
	if (!code) return false;
	const digest = (text: string) => createHash('sha256').update(text).digest();
	return timingSafeEqual(digest(typed.toUpperCase().replace(/[\s-]/g, '')), digest(code));
}

/** The code works once. */
export const forgetFirstRunCode = (): void => void (code = null);
