import { z } from 'zod';

/** Left empty, the device decides. */
export const themeForm = z.object({
	theme: z.enum(['', 'light', 'dark']).transform((theme) => theme || null)
});
