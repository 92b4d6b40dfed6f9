import { z } from 'zod';
import { isCivilDate } from '$lib/domain/calendar/civil-date';
import { mailAddress } from '$lib/domain/people/mail-address';
import { orNothing } from './read-form';

const rowNumber = z.coerce.number().int().positive();
const civilDate = z.string().refine(isCivilDate);
const text = (most: number) => z.string().trim().min(1).max(most);

export const memberForm = z.object({
	name: text(120),
	email: orNothing(mailAddress),
	phone: z.string().trim().max(40).default('')
});

export const grantForm = z
	.object({
		kind: z.enum(['membership', 'pack']),
		name: text(60),
		perWeek: orNothing(z.coerce.number().int().min(1).max(21)),
		credits: orNothing(z.coerce.number().int().min(1).max(500)),
		startsOn: civilDate,
		endsOn: orNothing(civilDate),
		note: z.string().trim().max(200).default('')
	})
	.transform(({ perWeek, credits, endsOn, note, ...pass }) => ({
		...pass,
		perWeek: perWeek ?? null,
		credits: credits ?? null,
		endsOn: endsOn ?? null,
		note: note || null
	}));

export const correctForm = z.object({
	passId: rowNumber,
	credits: z.coerce.number().int().min(-500).max(500),
	why: text(200)
});
export const endPassForm = z.object({ passId: rowNumber, why: text(200) });
export const cancelForm = z.object({
	bookingId: rowNumber,
	waive: z.string().trim().max(200).default('')
});
