import { z } from 'zod';

const rowNumber = z.coerce.number().int().positive();

export const markForm = z.object({
	bookingId: rowNumber,
	status: z.enum(['attended', 'no-show', 'booked']),
	late: z.preprocess((value) => value === 'yes', z.boolean())
});
export const giveForm = z.object({
	bookingId: z.preprocess((value) => (value === '' ? undefined : value), rowNumber.optional())
});
export const walkInForm = z.object({
	personId: rowNumber,
	passOver: z.string().trim().max(200).default(''),
	complimentary: z.string().trim().max(200).default('')
});
