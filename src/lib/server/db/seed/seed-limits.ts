import { limitsOf, type SlotLimits } from '../../slots/places';
import { classType } from './diary';
import { roomPlaces } from './programme';
import type { Rooms, SeedSlot } from './timetable';

/** What limits a slot besides the kit, as the server will read it. */
export const limitsOfSeed = (slot: SeedSlot, roomIds: Rooms): SlotLimits => ({
	roomPlaces: slot.roomId === roomIds.floor ? roomPlaces.floor : roomPlaces.loft,
	coaches: 1,
	peoplePerCoach: classType(slot).peoplePerCoach,
	setPlaces: slot.setPlaces
});

/** The most people in it, by room, coach and hand. */
export function mostIn(slot: SeedSlot, roomIds: Rooms): number {
	const { room, ratio, coaches, set } = limitsOf(limitsOfSeed(slot, roomIds));
	return Math.min(room, (ratio ?? Infinity) * (coaches ?? 1), set ?? Infinity);
}
