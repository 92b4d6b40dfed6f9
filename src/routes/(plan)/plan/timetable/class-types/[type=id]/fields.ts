import { fromMinorUnits } from '$lib/domain/booking/minor-units';

type ClassType = {
	name: string;
	about: string;
	colour: string;
	lengthMin: number;
	programmeId: number | null;
	priceCents: number;
	whoMayBook: string;
	opensDaysBefore: number;
	closesMinBefore: number;
	cutOffMin: number | null;
	cutOffClock: string | null;
	peoplePerCoach: number | null;
	defaultClaims: { kitGroupId: number; quantity: number; peoplePerPiece: number }[];
};

/** A stored class type as its form has it. */
export function fieldsOf(type: ClassType, currency: string): Record<string, string> {
	const claims = type.defaultClaims.flatMap((claim, i) =>
		Object.entries(claim).map(([name, value]) => [`claims.${i}.${name}`, String(value)])
	);
	return {
		name: type.name,
		about: type.about,
		colour: type.colour,
		lengthMin: String(type.lengthMin),
		programmeId: String(type.programmeId ?? ''),
		price: String(fromMinorUnits(type.priceCents, currency)),
		whoMayBook: type.whoMayBook,
		opensDaysBefore: String(type.opensDaysBefore),
		closesMinBefore: String(type.closesMinBefore),
		cutOff: type.cutOffClock === null ? 'minutes' : 'clock',
		cutOffMin: String(type.cutOffMin ?? ''),
		cutOffClock: type.cutOffClock ?? '',
		peoplePerCoach: String(type.peoplePerCoach ?? ''),
		...(Object.fromEntries(claims) as Record<string, string>)
	};
}
