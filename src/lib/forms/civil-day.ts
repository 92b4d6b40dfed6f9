import { z } from 'zod';
import { isCivilDate } from '$lib/domain/calendar/civil-date';

/** A civil date "YYYY-MM-DD" that exists, between 2000 and 2099. */
export const civilDay = z
	.string()
	.refine((text) => isCivilDate(text) && text.startsWith('20'), { message: 'odd-date' });
