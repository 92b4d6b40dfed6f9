import { z } from 'zod';
import { weekdays } from '$lib/domain/calendar/rule';
import { civilDay } from './civil-day';
import { clockTime } from './clock-time';
import { listOf, orNothing, ticked } from './read-form';
import { rowNumber } from './row-number';

/** How a rule is picked; `typed` takes one in RFC 5545's own words. */
export const ruleFields = z.object({
	repeats: z.enum(['weekly', 'daily', 'monthly', 'typed']).default('weekly'),
	every: z.coerce.number().int().min(1).max(52).default(1),
	days: listOf(z.enum(weekdays)),
	ends: z.enum(['never', 'until', 'count']).default('never'),
	untilOn: orNothing(civilDay),
	count: orNothing(z.coerce.number().int().min(1).max(400)),
	typedRule: z.string().trim().max(256).default('')
});
export type RuleFields = z.infer<typeof ruleFields>;

/** Lead coach first; selects left empty are nobody. */
const coaches = listOf(z.string())
	.transform((ids) => ids.filter((id) => id !== '').map(Number))
	.pipe(
		z
			.array(z.number().int().min(1))
			.min(1, { message: 'no-coach' })
			.max(8)
			.refine((ids) => new Set(ids).size === ids.length, { message: 'same-coach-twice' })
	);

export const standFields = z.object({
	classTypeId: rowNumber,
	roomId: rowNumber,
	coachIds: coaches,
	startsOn: civilDay,
	startTime: clockTime,
	lengthMin: z.coerce.number().int().min(5).max(480),
	setPlaces: orNothing(z.coerce.number().int().min(0).max(1000))
});

/** Sent back by who was shown what their change does. */
export const confirmFields = z.object({
	seen: orNothing(z.string().max(40)),
	overrideWhy: orNothing(z.string().trim().min(3).max(200))
});

export const seriesForm = standFields.extend(ruleFields.shape).extend(confirmFields.shape);
export type SeriesDraft = z.infer<typeof standFields> & RuleFields;

export const editSeriesForm = seriesForm.extend({
	scope: z.enum(['following', 'all']),
	version: rowNumber,
	includeChanged: ticked
});

export const endSeriesForm = confirmFields.extend({
	lastOn: civilDay,
	why: z.string().trim().min(3).max(200)
});
