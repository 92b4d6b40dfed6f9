import { getContext, setContext } from 'svelte';

export type GymFormat = {
	locale: string;
	zone: string;
	currency: string;
	loadUnit: 'kg' | 'lb';
	weekStartsOn: number;
};

/** 1 lb is 0.45359237 kg exactly (international yard and pound agreement, 1959). */
const kgPerLb = 0.45359237;

/**
 * Dates, numbers, money and loads in words, by the gym's settings. Instants are epoch
 * milliseconds shown on the gym's clock; civil dates are 'YYYY-MM-DD'; hours are 24.
 */
export function createFormats({ locale, zone, currency, loadUnit }: GymFormat) {
	const at = (options: Intl.DateTimeFormatOptions, timeZone = zone) => {
		const format = new Intl.DateTimeFormat(locale, { ...options, timeZone });
		return (instant: number) => format.format(instant).replaceAll(',', '');
	};
	const civil = (options: Intl.DateTimeFormatOptions) => {
		const format = at(options, 'UTC');
		return (date: string) => format(Date.parse(`${date}T00:00:00Z`));
	};
	const clock = new Intl.DateTimeFormat('en-GB', {
		hour: '2-digit',
		minute: '2-digit',
		hourCycle: 'h23',
		timeZone: zone
	});
	const dayShort = at({ weekday: 'short', day: 'numeric', month: 'short' });
	const number = new Intl.NumberFormat(locale, { maximumFractionDigits: 2 });
	const money = new Intl.NumberFormat(locale, { style: 'currency', currency });
	const minor = 10 ** (money.resolvedOptions().maximumFractionDigits ?? 2);
	const list = new Intl.ListFormat(locale, { type: 'conjunction' });

	return {
		/** 18:40 */
		time: (instant: number) => clock.format(instant),
		/** Tuesday 16 February */
		day: at({ weekday: 'long', day: 'numeric', month: 'long' }),
		/** Tue 16 Feb */
		dayShort,
		/** Tue 16 Feb, 18:40 */
		dayAndTime: (instant: number) => `${dayShort(instant)}, ${clock.format(instant)}`,
		/** Of civil dates: Tuesday 16 February 2027; Tue 16 Feb; Tuesday; Tue; T; 16; 16 February. */
		date: civil({ weekday: 'long', day: 'numeric', month: 'long', year: 'numeric' }),
		dateShort: civil({ weekday: 'short', day: 'numeric', month: 'short' }),
		weekday: civil({ weekday: 'long' }),
		weekdayShort: civil({ weekday: 'short' }),
		weekdayLetter: civil({ weekday: 'narrow' }),
		dayNumber: civil({ day: 'numeric' }),
		dayAndMonth: civil({ day: 'numeric', month: 'long' }),
		/** February */
		month: civil({ month: 'long' }),
		/** February 2027 */
		monthAndYear: civil({ month: 'long', year: 'numeric' }),
		number: (value: number) => number.format(value),
		/** Minor units: 1400 in EUR is €14.00. */
		money: (cents: number) => money.format(cents / minor),
		/** 12.5 kg, or to the half pound: 27.5 lb. */
		load: (kg: number) =>
			loadUnit === 'kg'
				? `${number.format(kg)} kg`
				: `${number.format(Math.round((kg / kgPerLb) * 2) / 2)} lb`,
		list: (words: string[]) => list.format(words)
	};
}

export type Formats = ReturnType<typeof createFormats>;

const key = Symbol('formats');

/** Given once by the root layout; a function, so that a change of settings reaches every part. */
export const setFormats = (formats: () => Formats) => setContext(key, formats);
export const getFormats = (): Formats => getContext<() => Formats>(key)();
