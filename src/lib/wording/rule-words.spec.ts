import { describe, expect, it } from 'vitest';
import { sayRule } from '$lib/domain/calendar';
import { createFormats } from './formats';
import { ruleWords } from './rule-words';

const zone = 'Europe/Dublin';
const formats = createFormats({
	locale: 'en-IE',
	zone,
	currency: 'EUR',
	loadUnit: 'kg',
	weekStartsOn: 1
});
const words = (rule: string) => {
	const result = sayRule(rule, zone);
	if (!result.ok) throw new Error(result.refused);
	return ruleWords(result.said, formats);
};

describe('a rule in words', () => {
	it.each([
		['FREQ=WEEKLY;BYDAY=MO,WE', 'Every Monday and Wednesday'],
		['FREQ=WEEKLY;INTERVAL=2;BYDAY=TU', 'Every 2 weeks on Tuesday'],
		['FREQ=WEEKLY', 'Every week'],
		['FREQ=WEEKLY;INTERVAL=3', 'Every 3 weeks'],
		['FREQ=DAILY', 'Every day'],
		['FREQ=DAILY;INTERVAL=2;BYMONTH=1,7', 'Every 2 days, in January and July'],
		['FREQ=DAILY;BYDAY=SA,SU', 'Every day, only on Saturday and Sunday'],
		['FREQ=MONTHLY', 'Every month'],
		['FREQ=MONTHLY;INTERVAL=2', 'Every 2 months'],
		['FREQ=MONTHLY;BYDAY=1FR', 'Every month on the first Friday'],
		[
			'FREQ=MONTHLY;INTERVAL=2;BYDAY=1SU,-1SU',
			'Every 2 months on the first Sunday and the last Sunday'
		],
		['FREQ=MONTHLY;BYDAY=-2MO', 'Every month on Monday number 2 from the end'],
		['FREQ=MONTHLY;BYMONTHDAY=2,15', 'Every month on day 2 and day 15'],
		['FREQ=MONTHLY;BYMONTHDAY=-1,-3', 'Every month on the last day and day 3 from the end'],
		['FREQ=MONTHLY;BYDAY=FR;BYMONTHDAY=13', 'Every month on each Friday, only on day 13'],
		['FREQ=WEEKLY;BYDAY=MO;COUNT=8', 'Every Monday, 8 times'],
		['FREQ=WEEKLY;BYDAY=MO;COUNT=1', 'Every Monday, once'],
		['FREQ=WEEKLY;BYDAY=MO;UNTIL=20261224', 'Every Monday, until Thursday 24 December 2026']
	])('%s: %s', (rule, said) => {
		expect(words(rule)).toBe(said);
	});
});
