import { randomUUID } from 'node:crypto';
import { instantOf } from '$lib/domain/calendar/zone';
import { refuse, type Refused } from '$lib/domain/refusal';
import type { SlotDraft } from '$lib/forms/slot';
import { audit } from '../audit/record';
import { isClosedOn } from '$lib/domain/calendar/closures';
import { closedDays } from '../closures/queries';
import { write } from '../db';
import { slotCoaches, slots } from '../db/schema';
import type { Viewer } from '../guard';
import { currentGym } from '../gym/queries';
import { missingFrom } from '../series/check';
import { clashesOf } from './clashes';
import { lookFirst, type Confirmed, type LookFirst } from './look';
import { recordOverrides } from './overrides';

export type SlotKind = 'class' | 'private' | 'open-gym';

/** Adds a one-off class, private session or open-gym hour. */
export async function addSlot(
	viewer: Viewer,
	draft: SlotDraft & { kind: SlotKind },
	{ now, ...confirmed }: Confirmed & { now: number }
): Promise<
	| { ok: true; slotId: number }
	| Refused<
			| 'no-gym'
			| 'starts-in-the-past'
			| 'closed-day'
			| 'unknown-class-type'
			| 'unknown-room'
			| 'unknown-coach'
	  >
	| LookFirst
> {
	return write(async (tx) => {
		const gym = await currentGym(tx);
		if (!gym) return refuse('no-gym');
		const startsAt = instantOf(draft.startsOn, draft.startTime, gym.zone);
		const endsAt = startsAt + draft.lengthMin * 60_000;
		if (startsAt <= now) return refuse('starts-in-the-past');
		const missing = await missingFrom(draft, tx);
		if (missing) return missing;
		if (isClosedOn(await closedDays(tx), draft.startsOn, draft.roomId)) return refuse('closed-day');

		const { kind, classTypeId, roomId, startsOn, startTime, coachIds, setPlaces } = draft;
		const intended = { uid: randomUUID(), slotId: null, seriesId: null };
		const clashes = await clashesOf([{ ...intended, startsAt, endsAt, roomId, coachIds }], tx);
		const look = lookFirst([], clashes, confirmed);
		if (look) return look;
		const why = confirmed.overrideWhy ?? '';
		await recordOverrides(tx, clashes, { why, byId: viewer.personId, now });
		const [made] = await tx
			.insert(slots)
			.values({
				uid: intended.uid,
				kind,
				classTypeId,
				roomId,
				startsOn,
				startTime,
				startsAt,
				endsAt,
				setPlaces: setPlaces ?? null,
				modifiedAt: now,
				createdAt: now
			})
			.returning({ id: slots.id });
		const slotId = made!.id;
		await tx
			.insert(slotCoaches)
			.values(coachIds.map((personId, position) => ({ slotId, personId, position })));
		await audit(tx, {
			viewer,
			verb: 'slots.add',
			noun: 'slots',
			nounId: slotId,
			now,
			detail: draft
		});
		return { ok: true, slotId };
	});
}
