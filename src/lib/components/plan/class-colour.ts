import type { ClassColour } from '$lib/domain/booking/class-type';

/** A class type's colour on staff screens: shades of the one hue, since other colours mean something. */
export const classColour: Record<ClassColour, string> = {
	pine: 'var(--effort-4)',
	moss: 'var(--effort-3)',
	fern: 'var(--effort-2)',
	sage: 'var(--effort-1)',
	stone: 'var(--line)',
	sand: 'var(--sunken)'
};
