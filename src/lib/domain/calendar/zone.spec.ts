import fc from 'fast-check';
import { Temporal } from 'temporal-polyfill';
import { describe, expect, it } from 'vitest';
import { clockChangeAt, dayBounds, instantOf, isZone, localDateOf, localOf } from '.';

const zones = Intl.supportedValuesOf('timeZone');

describe('between the wall clock and instants', () => {
	it('agrees with Temporal in every zone, near clock changes too', () => {
		const hours = fc.integer({ min: 0, max: 130 * 365 * 24 * 4 });
		fc.assert(
			fc.property(fc.constantFrom(...zones), hours, (zone, quarters) => {
				const at = quarters * 900_000;
				const change = Temporal.Instant.fromEpochMilliseconds(at)
					.toZonedDateTimeISO(zone)
					.getTimeZoneTransition('previous');
				for (const near of [at, ...(change ? [change.epochMilliseconds - 1_800_000] : [])]) {
					const shown = Temporal.Instant.fromEpochMilliseconds(near).toZonedDateTimeISO(zone);
					const { on, time } = localOf(near, zone);
					expect(`${on}T${time}`).toBe(shown.toPlainDateTime().toString().slice(0, 16));
					const back = Temporal.PlainDateTime.from(`${on}T${time}`).toZonedDateTime(zone);
					expect(instantOf(on, time, zone)).toBe(back.epochMilliseconds);
				}
			}),
			{ numRuns: 80 }
		);
	}, 30_000);

	it('says what a clock change does to a time', () => {
		expect(clockChangeAt('2026-03-29T01:30', 'Europe/Dublin')).toBe('skipped');
		expect(clockChangeAt('2026-10-25T01:30', 'Europe/Dublin')).toBe('twice');
		expect(clockChangeAt('2026-10-25T02:00', 'Europe/Dublin')).toBeNull();
	});

	it('has days of 23, 24 and 25 hours', () => {
		const hoursOf = (on: string) => {
			const { startsAt, endsAt } = dayBounds(on, 'Europe/Dublin');
			return (endsAt - startsAt) / 3_600_000;
		};
		expect(['2026-03-29', '2026-06-01', '2026-10-25'].map(hoursOf)).toEqual([23, 24, 25]);
	});

	it('gives the civil date of the gym, not of the server', () => {
		const at = Date.parse('2026-12-01T23:30:00Z');
		expect(['UTC', 'Australia/Sydney', 'America/New_York'].map((z) => localDateOf(at, z))).toEqual([
			'2026-12-01',
			'2026-12-02',
			'2026-12-01'
		]);
	});

	it('knows IANA names alone', () => {
		expect(['Europe/Dublin', 'UTC'].every(isZone)).toBe(true);
		expect(['', '+01:00', 'Dublin', 'Europe/Dublin[u-ca=hebrew]', '../etc'].some(isZone)).toBe(
			false
		);
	});
});
