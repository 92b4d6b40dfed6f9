/** Civil days, both included, on which the gym is shut, or one room where `roomId` names it. */
export type ClosedDays = { fromOn: string; toOn: string; roomId?: number | null };

/** Whether a room is shut on a civil day; without a room, whether the whole gym is. */
export const isClosedOn = (
	closures: readonly ClosedDays[],
	on: string,
	roomId: number | null = null
): boolean =>
	closures.some(
		(closure) =>
			closure.fromOn <= on &&
			on <= closure.toOn &&
			(closure.roomId == null || closure.roomId === roomId)
	);
