import { z } from 'zod';

/** What a member's form of a class says: a way and a load by prescription, and a word to the coach. */
export const classChoices = z.object({
	variation: z.record(z.string().max(64), z.coerce.number().int().positive()).default({}),
	load: z.record(z.string().max(64), z.string().max(10)).default({}),
	note: z.string().trim().max(300).default('')
});

/** Choices as a booking takes them; a load left open is not stated. */
export function choicesOf({ variation, load, note }: z.infer<typeof classChoices>) {
	const loads = Object.entries(load).filter(([, kg]) => kg !== '' && Number(kg) > 0);
	return {
		variations: variation,
		loads: Object.fromEntries(loads.map(([id, kg]) => [id, Number(kg)])),
		note
	};
}

export const ownBooking = z.object({ bookingId: z.coerce.number().int().positive() });
