import { z } from 'zod';
import { addDays, isCivilDate } from '$lib/domain/calendar/civil-date';

/** Request bodies and queries of the HTTP API; the OpenAPI document is made from these. */

const civilDate = z.string().refine(isCivilDate).meta({ format: 'date', example: '2026-12-01' });
const rowNumber = z.number().int().positive();

/** Longest range that one request may ask for, both days included. */
export const mostDays = 93;

export const dayRange = z
	.object({ from: civilDate, to: civilDate })
	.refine(({ from, to }) => to >= from, { path: ['to'], params: { code: 'ends-before-start' } })
	.refine(({ from, to }) => to < addDays(from, mostDays), { path: ['to'] });

export const bookingBody = z.strictObject({
	variations: z
		.record(z.string().max(64), rowNumber)
		.refine((choices) => Object.keys(choices).length <= 200)
		.optional()
		.meta({ description: 'Variation ids by prescription id' }),
	loads: z
		.record(
			z.string().max(64),
			z.union([z.number().positive().max(500), z.tuple([z.number(), z.number()])])
		)
		.refine((choices) => Object.keys(choices).length <= 200)
		.optional()
		.meta({ description: 'Kilograms by prescription id: one load, or the lowest and the highest' }),
	payment: z.enum(['pass', 'drop-in']).optional(),
	memberId: rowNumber.optional().meta({ description: 'Wants bookings:write-any' }),
	note: z.string().trim().max(300).optional()
});

export const rollBody = z.strictObject({
	marks: z
		.array(
			z.strictObject({
				bookingId: rowNumber,
				status: z.enum(['attended', 'no-show', 'booked']),
				late: z.boolean().optional(),
				at: z.iso.datetime({ offset: true }).optional()
			})
		)
		.min(1)
		.max(200)
});

/** One sentence a field of a body that a schema refuses. */
export function fieldErrors(error: z.ZodError, say: (issue: z.core.$ZodIssue) => string) {
	const errors: Record<string, string> = {};
	for (const issue of error.issues) errors[issue.path.join('.') || 'body'] ??= say(issue);
	return errors;
}
