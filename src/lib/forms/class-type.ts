import { z } from 'zod';
import { bookers, classColours } from '$lib/domain/booking/class-type';
import { clockTime } from './clock-time';
import { orNothing } from './read-form';
import { rowNumber } from './row-number';

/** A row of the default claims left empty is no claim. */
const claimRow = z.object({
	kitGroupId: orNothing(rowNumber),
	quantity: orNothing(z.coerce.number().int().min(1).max(50)),
	peoplePerPiece: orNothing(z.coerce.number().int().min(1).max(50))
});

const claims = z
	.array(claimRow)
	.max(20)
	.default([])
	.transform((rows) =>
		rows.flatMap(({ kitGroupId, quantity = 1, peoplePerPiece = 1 }) =>
			kitGroupId === undefined ? [] : [{ kitGroupId, quantity, peoplePerPiece }]
		)
	)
	.refine((rows) => new Set(rows.map((row) => row.kitGroupId)).size === rows.length, {
		message: 'same-kit-twice'
	})
	.refine((rows) => rows.every((row) => row.quantity === 1 || row.peoplePerPiece === 1), {
		message: 'sharing'
	});

export const classTypeForm = z
	.object({
		name: z.string().trim().min(1).max(60),
		about: z.string().trim().max(2000).default(''),
		colour: z.enum(classColours),
		lengthMin: z.coerce.number().int().min(5).max(480),
		programmeId: orNothing(rowNumber),
		/** In whole units of the gym's currency, as typed. */
		price: z.coerce.number().min(0).max(10_000),
		whoMayBook: z.enum(bookers),
		opensDaysBefore: z.coerce.number().int().min(0).max(365),
		closesMinBefore: z.coerce.number().int().min(0).max(10_080),
		cutOff: z.enum(['minutes', 'clock']),
		cutOffMin: orNothing(z.coerce.number().int().min(0).max(20_160)),
		cutOffClock: orNothing(clockTime),
		peoplePerCoach: orNothing(z.coerce.number().int().min(1).max(500)),
		claims
	})
	.refine((type) => type.cutOff !== 'minutes' || type.cutOffMin !== undefined, {
		path: ['cutOffMin'],
		message: 'fill-in'
	})
	.refine((type) => type.cutOff !== 'clock' || type.cutOffClock !== undefined, {
		path: ['cutOffClock'],
		message: 'fill-in'
	});
export type ClassTypeDraft = z.infer<typeof classTypeForm>;

export const whichClassTypeForm = z.object({ classTypeId: rowNumber });
