import fc from 'fast-check';
import { RRuleTemporal } from 'rrule-temporal';
import { describe, expect, it } from 'vitest';
import { occurrences, readRule, ruleText, weekdays, type Rule, type RuleDay } from '.';

const zones = ['America/New_York', 'Europe/London', 'Australia/Sydney', 'America/Santiago'];
const some = <T>(values: readonly T[], maxLength: number) =>
	fc.uniqueArray(fc.constantFrom(...values), { maxLength });
const range = (from: number, to: number) =>
	Array.from({ length: to - from + 1 }, (_, i) => from + i).filter((n) => n !== 0);

const withoutOrdinals = (days: RuleDay[]): RuleDay[] =>
	[...new Set(days.map(({ day }) => day))].map((day) => ({ ordinal: null, day }));

/** Any rule within what is allowed: the frequencies each with the parts that they take. */
const rules: fc.Arbitrary<Rule> = fc
	.record({
		frequency: fc.constantFrom<Rule['frequency'][]>('DAILY', 'WEEKLY', 'MONTHLY'),
		interval: fc.oneof(fc.constant(1), fc.integer({ min: 2, max: 6 }), fc.constant(52)),
		end: fc.oneof(
			fc.constant(null),
			fc.integer({ min: 1, max: 40 }),
			fc.integer({ min: 0, max: 700 * 24 }).map((hours) => ({
				kind: 'instant' as const,
				at: Date.parse('2026-03-02T12:00:00Z') + hours * 3_600_000
			}))
		),
		days: fc.uniqueArray(
			fc.record({
				ordinal: fc.option(fc.constantFrom(...range(-5, 5)), { freq: 2 }),
				day: fc.constantFrom(...weekdays)
			}),
			{ maxLength: 4, selector: ({ ordinal, day }) => `${ordinal}${day}` }
		),
		monthDays: fc.oneof(fc.constant<number[]>([]), some(range(-31, 31), 5)),
		months: fc.oneof({ weight: 3, arbitrary: fc.constant<number[]>([]) }, some(range(1, 12), 5)),
		weekStart: fc.constantFrom<Rule['weekStart'][]>('MO', 'SU')
	})
	.map(({ end, frequency, days, monthDays, ...rule }) => ({
		...rule,
		frequency,
		count: typeof end === 'number' ? end : null,
		until: typeof end === 'number' ? null : end,
		days: frequency === 'MONTHLY' ? days : withoutOrdinals(days),
		monthDays: frequency === 'WEEKLY' ? [] : monthDays
	}));

describe('a second opinion on random allowed rules', () => {
	it('reads every rule back from its own text', () => {
		fc.assert(
			fc.property(rules, (rule) => {
				const text = ruleText(rule);
				const read = readRule(text);
				expect(read.ok && ruleText(read.rule)).toBe(text);
			})
		);
	});

	/** rrule-temporal expands in the zone by itself, by other code than ours and than the rrule package's. */
	it('agrees with rrule-temporal in four zones over two years', () => {
		fc.assert(
			fc.property(rules, fc.constantFrom(...zones), (rule, zone) => {
				const text = ruleText(rule);
				const ours = occurrences({
					startLocal: '2026-03-02T18:40',
					zone,
					rule: text,
					toOn: '2028-02-29',
					limit: 1000
				});
				const theirs = new RRuleTemporal({
					rruleString: `DTSTART;TZID=${zone}:20260302T184000\nRRULE:${text}`
				}).between(new Date('2026-03-01T00:00:00Z'), new Date('2028-03-02T00:00:00Z'), true);
				const wanted = theirs
					.map((t) => `${t.toPlainDateTime().toString().slice(0, 16)} ${t.epochMilliseconds}`)
					.filter((t) => t < '2028-03-01');
				if (!ours.ok) {
					expect([ours.refused, wanted]).toEqual(['ends-before-start', []]);
					return;
				}
				expect(ours.occurrences.map((o) => `${o.localStart} ${o.startsAt}`)).toEqual(wanted);
			}),
			{ numRuns: 80 }
		);
	}, 30_000);

	it('starts reading late without missing anything', () => {
		fc.assert(
			fc.property(rules, fc.integer({ min: 1, max: 40 }), (rule, months) => {
				const asked = { startLocal: '2026-03-02T18:40', zone: zones[0]!, rule: ruleText(rule) };
				const fromOn = new Date(Date.UTC(2026, 2 + months, 17)).toISOString().slice(0, 10);
				const all = occurrences({ ...asked, toOn: '2030-06-30', limit: 5000 });
				const late = occurrences({ ...asked, fromOn, toOn: '2030-06-30', limit: 5000 });
				if (!all.ok || !late.ok) {
					expect(late).toEqual(all);
					return;
				}
				expect(late.occurrences.map((o) => o.key)).toEqual(
					all.occurrences.map((o) => o.key).filter((key) => key >= fromOn)
				);
			}),
			{ numRuns: 60 }
		);
	}, 30_000);
});
