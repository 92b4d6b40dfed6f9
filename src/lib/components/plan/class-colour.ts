/** A class type's colour on staff screens: shades of the one hue, since other colours mean something. */
export const classColour = {
	pine: 'var(--effort-4)',
	moss: 'var(--effort-3)',
	fern: 'var(--effort-2)',
	sage: 'var(--effort-1)',
	stone: 'var(--line)',
	sand: 'var(--sunken)'
} as const;

export type ClassColour = keyof typeof classColour;
