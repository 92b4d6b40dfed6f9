import { z } from 'zod';
import { ticked } from './read-form';

export const movementPatterns = [
	'squat',
	'hinge',
	'horizontal push',
	'vertical push',
	'horizontal pull',
	'vertical pull',
	'lunge',
	'carry',
	'trunk',
	'conditioning',
	'mobility'
] as const;

const rowNumber = z.coerce.number().int().positive();
const need = z.object({
	kitGroupId: z.preprocess((value) => (value === '' ? undefined : value), rowNumber.optional()),
	quantity: z.coerce.number().int().min(1).max(20).default(1),
	peoplePerPiece: z.coerce.number().int().min(1).max(20).default(1)
});

/** A movement with its ladder, hardest first; rungs and needs left empty are not there. */
export const movementForm = z
	.object({
		name: z.string().trim().min(1).max(80),
		pattern: z.enum(movementPatterns),
		muscles: z.string().trim().min(1).max(200),
		perSide: ticked,
		secondsPerRep: z.coerce.number().positive().max(120),
		cues: z.string().trim().max(500).default(''),
		cautions: z.string().trim().max(500).default(''),
		basedOn: z.coerce.number().int().min(0),
		ladder: z
			.array(
				z.object({
					id: z.preprocess((value) => (value === '' ? undefined : value), rowNumber.optional()),
					name: z.string().trim().max(80),
					needs: z.array(need).max(6).default([])
				})
			)
			.max(20)
	})
	.transform(({ basedOn, muscles, ladder, ...rest }) => ({
		basedOn,
		input: {
			...rest,
			muscles: muscles
				.split(/[\s,]+/)
				.filter(Boolean)
				.slice(0, 12),
			ladder: ladder
				.filter(({ name }) => name !== '')
				.map(({ id, name, needs }) => ({
					id: id ?? null,
					name,
					needs: needs.flatMap(({ kitGroupId, ...numbers }) =>
						kitGroupId === undefined ? [] : [{ kitGroupId, ...numbers }]
					)
				}))
		}
	}));
