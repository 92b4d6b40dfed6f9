import type { z } from 'zod';
import type { RollRow } from '../roll/queries';
import type { rollShape } from './shapes';
import { isoIn } from './write-slot';

export const writeRoll = (
	slotId: number,
	rows: RollRow[],
	zone: string
): z.infer<typeof rollShape> => ({
	slotId,
	roll: rows.map(({ bookingId, personId, name, status, isLate, checkedInAt, position }) => ({
		bookingId,
		member: { id: personId, name },
		status,
		late: isLate,
		...(checkedInAt === null ? {} : { at: isoIn(checkedInAt, zone) }),
		...(position === null ? {} : { position })
	}))
});
