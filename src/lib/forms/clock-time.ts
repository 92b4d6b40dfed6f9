import { z } from 'zod';

/** A wall-clock time "HH:MM". */
export const clockTime = z.string().regex(/^([01]\d|2[0-3]):[0-5]\d$/, { message: 'odd-time' });
