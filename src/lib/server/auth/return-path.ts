/** Where a page may send a browser back to: a path of ours in plain characters. */
const plainPath = /^\/(?!\/)[\w\-.~!$&'()*+,;=:@%/?[\]]*$/;
/** Encoded slashes, backslashes and controls are read differently by different parties. */
const encodedTrick = /%(?:0[0-9a-f]|1[0-9a-f]|2f|5c|7f)/i;
/** Pages that would lead straight out again. */
const doors = /^\/(?:sign-in|sign-out|sign-up|auth|first-run)(?:[/?]|$)/;

/** `to` when it is a path within this site, else `fallback`. */
export function returnPath(to: string | null | undefined, fallback: string): string {
	if (!to || to.length > 500 || !plainPath.test(to)) return fallback;
	const path = to.split('?')[0] ?? '';
	if (encodedTrick.test(path) || path.includes('//') || doors.test(to)) return fallback;
	return to;
}
