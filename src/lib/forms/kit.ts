import { z } from 'zod';
import { orNothing, ticked } from './read-form';

const rowNumber = z.coerce.number().int().positive();
const text = (most: number) => z.string().trim().min(1).max(most);

export const groupForm = z.object({ name: text(60), plural: text(60), hasLoads: ticked });
export const itemForm = z.object({
	kitGroupId: rowNumber,
	loadKg: orNothing(z.coerce.number().positive().max(500)),
	count: z.coerce.number().int().min(0).max(1000),
	roomId: orNothing(rowNumber),
	note: z.string().trim().max(200).default('')
});
export const changeItemForm = z.object({
	id: rowNumber,
	count: z.coerce.number().int().min(0).max(1000),
	roomId: orNothing(rowNumber),
	note: z.string().trim().max(200).default('')
});
const localTime = z.string().regex(/^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}$/);
export const spellForm = z.object({
	kitItemId: rowNumber,
	count: z.coerce.number().int().min(1).max(1000),
	from: localTime,
	to: orNothing(localTime),
	why: text(200)
});
export const rowForm = z.object({ id: rowNumber });
