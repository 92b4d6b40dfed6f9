import { z } from 'zod';
import { civilDay } from './civil-day';
import { orNothing } from './read-form';
import { rowNumber } from './row-number';
import { confirmFields } from './series';

export const closureForm = confirmFields
	.extend({
		/** Left empty: the whole gym. */
		roomId: orNothing(rowNumber),
		fromOn: civilDay,
		toOn: civilDay,
		why: z.string().trim().min(3).max(200)
	})
	.refine(({ fromOn, toOn }) => toOn >= fromOn, {
		path: ['toOn'],
		message: 'ends-before-start'
	});
export type ClosureDraft = Pick<z.infer<typeof closureForm>, 'roomId' | 'fromOn' | 'toOn' | 'why'>;

export const endClosureForm = z.object({ closureId: rowNumber });
