/** An entry of a shell's navigation; `needs` are the capabilities of which one opens it. */
export type ShellLink = { href: string; label: string; needs: string[] };

/** The entries that the viewer may open. */
export const openLinks = (links: ShellLink[], capabilities: readonly string[]): ShellLink[] =>
	links.filter(
		({ needs }) => needs.length === 0 || needs.some((need) => capabilities.includes(need))
	);

/** Whether the page at `path` lies under `href`. */
export const isUnder = (path: string, href: string): boolean =>
	path === href || path.startsWith(`${href}/`);
