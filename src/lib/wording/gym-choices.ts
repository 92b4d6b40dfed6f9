import { locales } from '$lib/forms/gym';
import * as m from './compiled/messages';

export type GymChoices = ReturnType<typeof gymChoices>;

/** What a gym may choose from, with the words for it. */
export function gymChoices() {
	const names = (type: 'currency' | 'region') => new Intl.DisplayNames('en', { type });
	return {
		zones: [...Intl.supportedValuesOf('timeZone'), 'UTC'],
		currencies: Intl.supportedValuesOf('currency').map((code) => ({
			value: code,
			label: `${code}, ${names('currency').of(code) ?? code}`
		})),
		locales: locales.map((locale) => ({
			value: locale,
			label: m.office_locale_name({
				region: names('region').of(locale.split('-')[1] ?? '') ?? locale,
				sample: new Intl.DateTimeFormat(locale, { timeZone: 'UTC' }).format(sampleDay)
			})
		})),
		loadUnits: [
			{ value: 'kg', label: m.office_load_unit_kg() },
			{ value: 'lb', label: m.office_load_unit_lb() }
		],
		weekDays: [1, 2, 3, 4, 5, 6, 7].map((day) => ({
			value: String(day),
			label: new Intl.DateTimeFormat('en', { weekday: 'long', timeZone: 'UTC' }).format(
				Date.UTC(2024, 0, day)
			)
		}))
	};
}

/** Day and month cannot be mistaken for each other; 1 January 2024 was a Monday. */
const sampleDay = Date.UTC(2024, 11, 31);
