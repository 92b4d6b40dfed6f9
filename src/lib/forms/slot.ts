import { z } from 'zod';
import { confirmFields, standFields } from './series';

/** A one-off slot. */
export const addSlotForm = standFields.extend(confirmFields.shape).extend({
	kind: z.enum(['class', 'private', 'open-gym']).default('class')
});
export type SlotDraft = z.infer<typeof standFields>;

/** `sequence` is the slot's as the form showed it: a change in between is noticed. */
export const changeSlotForm = standFields.extend(confirmFields.shape).extend({
	sequence: z.coerce.number().int().min(0),
	why: z.string().trim().max(200).default('')
});

export const callOffForm = confirmFields.extend({ why: z.string().trim().min(3).max(200) });
export const bringBackForm = confirmFields;
