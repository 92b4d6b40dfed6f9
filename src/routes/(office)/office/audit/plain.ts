/** "out_of_service_spells" reads "out of service spells". */
export const plainNoun = (noun: string): string => noun.replace(/[_-]/g, ' ');

/** The details of an entry on one line: "name Loft, places 8 to 10". Row numbers say nothing here. */
export function facts(detail: Record<string, unknown>): string {
	return Object.entries(detail)
		.filter(([key, value]) => !/Ids?$/.test(key) && value !== false && value !== null)
		.map(([key, value]) => (value === true ? plainWords(key) : `${plainWords(key)} ${said(value)}`))
		.join(', ');
}

/** "placeName" reads "place name". */
const plainWords = (key: string) =>
	key.replace(/[A-Z]/g, (letter) => ` ${letter.toLowerCase()}`).replace(/[_-]/g, ' ');

function said(value: unknown): string {
	if (Array.isArray(value)) return value.map(said).join(' to ');
	return value !== null && typeof value === 'object' ? JSON.stringify(value) : String(value);
}
