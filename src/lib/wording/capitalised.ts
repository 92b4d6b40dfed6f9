/** "Rowers" for "rowers": a word that begins a sentence. */
export const capitalised = (text: string): string =>
	text.charAt(0).toLocaleUpperCase() + text.slice(1);
