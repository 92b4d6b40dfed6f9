import { z } from 'zod';

/** A row's number as a form or an address carries it. */
export const rowNumber = z.coerce.number().int().min(1).max(Number.MAX_SAFE_INTEGER);
