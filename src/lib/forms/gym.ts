import { z } from 'zod';

const zones = new Set(Intl.supportedValuesOf('timeZone')).add('UTC');
const currencies = new Set(Intl.supportedValuesOf('currency'));

/** How dates, numbers and money are written; English until there are more message files. */
export const locales = ['en-IE', 'en-GB', 'en-US', 'en-AU', 'en-CA', 'en-NZ', 'en-ZA'] as const;

export const gymForm = z.object({
	name: z.string().trim().min(1).max(80),
	placeName: z.string().trim().min(1).max(80),
	zone: z.string().refine((zone) => zones.has(zone), { message: 'unknown-zone' }),
	currency: z.string().refine((code) => currencies.has(code), { message: 'unknown-currency' }),
	locale: z.enum(locales),
	loadUnit: z.enum(['kg', 'lb']),
	weekStartsOn: z.coerce.number().int().min(1).max(7)
});
export type GymSettings = z.infer<typeof gymForm>;
