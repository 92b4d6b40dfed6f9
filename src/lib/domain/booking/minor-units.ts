/** Decimals of a currency (ISO 4217, as the runtime's Intl knows them): 2 for EUR, 0 for JPY. */
export function decimalsOf(currency: string): number {
	const { maximumFractionDigits } = new Intl.NumberFormat('en', {
		style: 'currency',
		currency
	}).resolvedOptions();
	return maximumFractionDigits ?? 2;
}

/** An amount as typed, in minor units: 14.5 EUR is 1450. */
export const toMinorUnits = (amount: number, currency: string): number =>
	Math.round(amount * 10 ** decimalsOf(currency));

export const fromMinorUnits = (minor: number, currency: string): number =>
	minor / 10 ** decimalsOf(currency);
