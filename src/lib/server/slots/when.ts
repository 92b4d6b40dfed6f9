/** "Tue 1 Dec, 18:40 to 19:40" in the gym's zone, for letters. */
export function whenOf(
	{ startsAt, endsAt }: { startsAt: number; endsAt: number },
	{ locale, zone }: { locale: string; zone: string }
): { day: string; from: string; to: string } {
	const day = new Intl.DateTimeFormat(locale, {
		timeZone: zone,
		weekday: 'long',
		day: 'numeric',
		month: 'long'
	});
	const clock = new Intl.DateTimeFormat(locale, {
		timeZone: zone,
		hour: '2-digit',
		minute: '2-digit',
		hourCycle: 'h23'
	});
	return { day: day.format(startsAt), from: clock.format(startsAt), to: clock.format(endsAt) };
}
