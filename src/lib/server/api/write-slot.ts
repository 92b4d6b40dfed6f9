import { Temporal } from 'temporal-polyfill';
import type { z } from 'zod';
import type { SessionContent } from '$lib/domain/training';
import { blockTitle } from '$lib/wording/blocks';
import type { Library } from '../kit/library';
import type { SlotRow } from '../slots/queries';
import type { oneSlotShape, sessionShape, slotShape } from './shapes';

/** An instant in ISO 8601 with the offset that the gym has at it. */
export const isoIn = (at: number, zone: string): string =>
	Temporal.Instant.fromEpochMilliseconds(at).toString({ timeZone: zone, smallestUnit: 'second' });

export function writeSlot(slot: SlotRow, zone: string): z.infer<typeof slotShape> {
	const { id, name } = slot.room;
	return {
		id: slot.id,
		startsAt: isoIn(slot.startsAt, zone),
		endsAt: isoIn(slot.endsAt, zone),
		title: slot.title,
		classType: { id: slot.classType.id, name: slot.classType.name },
		room: { id, name },
		coaches: slot.coaches,
		status: slot.cancelledAt === null ? 'scheduled' : 'cancelled',
		places: slot.places,
		...(slot.session ? { blocks: slot.session.blocks.map(writeBlock) } : {}),
		...(slot.mine ? { myBooking: writeMine(slot.mine) } : {})
	};
}

const writeBlock = (block: NonNullable<SlotRow['session']>['blocks'][number]) => ({
	title: blockTitle(block),
	startS: block.startS,
	endS: block.endS,
	effort: block.effort
});

export const writeMine = ({ id, status, position }: NonNullable<SlotRow['mine']>) => ({
	id,
	status,
	...(position === null ? {} : { position })
});

/** The slot with its session: shown once published. */
export function writeOneSlot(
	slot: SlotRow,
	zone: string,
	content: SessionContent | null,
	library: Library
): z.infer<typeof oneSlotShape> {
	if (!slot.session || !content) return writeSlot(slot, zone);
	const session: z.infer<typeof sessionShape> = {
		id: slot.session.id,
		title: slot.session.title,
		aim: content.aim,
		blocks: slot.session.blocks.map((block) => ({
			...writeBlock(block),
			kind: block.kind,
			prescriptions: (
				content.blocks.find(({ id }) => id === block.id)?.prescriptions ?? []
			).flatMap((prescription) => {
				const movement = library.movements[prescription.movementId];
				const variation = movement?.ladder.find(({ id }) => id === prescription.variationId);
				if (!movement || !variation) return [];
				return {
					id: prescription.id,
					movement: { id: movement.id, name: movement.name },
					variation: { id: variation.id, name: variation.name },
					choices: movement.ladder
						.filter(({ archived }) => !archived)
						.map(({ id, name }) => ({ id, name })),
					cautions: movement.cautions
				};
			})
		}))
	};
	return { ...writeSlot(slot, zone), session };
}
