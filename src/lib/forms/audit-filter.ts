import { z } from 'zod';

const rowNumber = z.coerce.number().int().min(1).max(Number.MAX_SAFE_INTEGER);

/** What stands in the address of the audit page; anything odd in it counts as not there. */
export const auditFilterForm = z.object({
	before: rowNumber.optional().catch(undefined),
	who: rowNumber.optional().catch(undefined),
	area: z
		.string()
		.regex(/^[a-z-]{1,40}$/)
		.optional()
		.catch(undefined)
});
