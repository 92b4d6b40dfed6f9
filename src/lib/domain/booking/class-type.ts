/** Colours that a class type may have; shades, as every other colour on a screen means something. */
export const classColours = ['pine', 'sage', 'moss', 'fern', 'stone', 'sand'] as const;
export type ClassColour = (typeof classColours)[number];

/** Who may book a class type. */
export const bookers = ['anyone', 'pass-holders', 'staff'] as const;
