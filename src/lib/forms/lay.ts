import { z } from 'zod';
import { listOf, orNothing } from './read-form';
import { rowNumber } from './row-number';
import { confirmFields } from './series';

/** `session` left empty takes what is laid off the slots. */
export const layForm = confirmFields.extend({
	slots: listOf(rowNumber).pipe(z.array(z.number()).min(1, { message: 'no-slots' }).max(100)),
	session: orNothing(rowNumber)
});
export type LayDraft = z.infer<typeof layForm>;
