import { z } from 'zod';

const json = z
	.string()
	.max(400_000)
	.transform((text, ctx) => {
		try {
			return JSON.parse(text) as unknown;
		} catch {
			ctx.addIssue({ code: 'custom', message: 'unreadable' });
			return z.NEVER;
		}
	});

/** The session editor's form: the content travels as JSON, checked by the rules of a session. */
export const sessionForm = z.object({
	content: json,
	lengthMin: z.coerce.number().int().min(5).max(480),
	programmeId: z.preprocess(
		(value) => (value === '' ? undefined : value),
		z.coerce.number().int().positive().optional()
	),
	basedOn: z.coerce.number().int().min(0),
	overwrite: z.preprocess((value) => value === 'yes', z.boolean())
});
