import { z } from 'zod';
import { mailAddress } from '$lib/domain/people/mail-address';
import { gymForm } from './gym';
import { newPassword, personName } from './new-password';

const room = z.object({
	name: z.string().trim().max(60),
	places: z.union([z.literal(''), z.coerce.number().int().min(1).max(1000)])
});

/** Rows of rooms that were left empty are not rooms. */
const filledRooms = z
	.array(room)
	.transform((rows) => rows.filter((row) => row.name !== '' || row.places !== ''))
	.pipe(
		z
			.array(
				z.object({
					name: z.string().min(1),
					places: z.number().int().min(1)
				})
			)
			.min(1)
			.max(20)
			.refine((rows) => new Set(rows.map((row) => row.name.toLowerCase())).size === rows.length, {
				message: 'same-room-twice'
			})
	);

export const firstRunForm = z.object({
	code: z.string().min(1).max(40),
	gym: gymForm,
	rooms: filledRooms,
	owner: z.object({ name: personName, email: mailAddress, password: newPassword })
});
export type FirstRun = z.infer<typeof firstRunForm>;
