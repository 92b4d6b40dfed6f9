import type { NextDates, PickedDates } from '$lib/domain/calendar/next-dates';
import { weekdays } from '$lib/domain/calendar/rule';
import type { Refused } from '$lib/domain/refusal';

export type DatesAnswer = ({ ok: true } & NextDates) | Refused;

/** What a half-filled form holds of a rule; null until it has a day, a time and a length. */
export function pickedDates(form: FormData): PickedDates | null {
	const text = (name: string) => String(form.get(name) ?? '');
	const [startsOn, startTime] = [text('startsOn'), text('startTime')];
	const lengthMin = Number(text('lengthMin'));
	if (!startsOn || !startTime || !(lengthMin > 0)) return null;
	const days = form.getAll('days').map(String);
	return {
		startsOn,
		startTime,
		lengthMin,
		repeats: oneOf(['weekly', 'daily', 'monthly', 'typed'], text('repeats')),
		every: Number(text('every')) || 1,
		days: weekdays.filter((day) => days.includes(day)),
		ends: oneOf(['never', 'until', 'count'], text('ends')),
		...(text('untilOn') ? { untilOn: text('untilOn') } : {}),
		...(text('count') ? { count: Number(text('count')) } : {}),
		typedRule: text('typedRule')
	};
}

function oneOf<T extends string>(allowed: readonly [T, ...T[]], value: string): T {
	return allowed.find((one) => one === value) ?? allowed[0];
}

/** What was typed, to fill the form again where no script keeps it. */
export function typedFields(form: FormData): Record<string, string | string[]> {
	const names = [...new Set(form.keys())];
	return Object.fromEntries(names.map((name) => [name, form.getAll(name).map(String)]));
}
