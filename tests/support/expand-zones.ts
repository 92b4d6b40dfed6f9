import { Temporal } from 'temporal-polyfill';
import { addDays, daysFrom, occurrences } from '../../src/lib/domain/calendar';

/**
 * Run as a process of its own, with TZ set, by the zones spec: expands a week around each clock
 * change and prints what it found beside what Temporal alone says of the same wall-clock times.
 */
type Zone = { zone: string; gap: string; fold: string };
const zones = JSON.parse(process.argv[2]!) as Zone[];

const rows = zones.flatMap((zone) =>
	(['gap', 'fold'] as const).flatMap((around) =>
		['18:00', zone[around].slice(11)].map((time) => rowOf(zone, around, time))
	)
);
process.stdout.write(JSON.stringify(rows));

function rowOf(zone: Zone, around: 'gap' | 'fold', time: string) {
	const on = daysFrom(addDays(zone[around].slice(0, 10), -3), 7);
	const startLocal = `${on[0]}T${time}`;
	const monthDays = on.map((day) => Number(day.slice(8))).join(',');
	const rule = `FREQ=DAILY;COUNT=7;BYMONTHDAY=${monthDays}`;
	const read = occurrences({ startLocal, zone: zone.zone, rule });
	if (!read.ok) throw new Error(read.refused);
	const oracle = on.map((day) => {
		const start = Temporal.PlainDateTime.from(`${day}T${time}`).toZonedDateTime(zone.zone, {
			disambiguation: 'compatible'
		});
		return {
			at: start.epochMilliseconds,
			local: start.toPlainDateTime().toString({ smallestUnit: 'minute' })
		};
	});
	return { zone: zone.zone, around, time, on, seen: read.occurrences, oracle };
}
