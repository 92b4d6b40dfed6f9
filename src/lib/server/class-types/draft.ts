import { toMinorUnits } from '$lib/domain/booking/minor-units';
import { refuse, type Refused } from '$lib/domain/refusal';
import type { ClassTypeDraft } from '$lib/forms/class-type';
import type { Tx } from '../db';
import { currentGym } from '../gym/queries';
import { classTypeChoices, isClassTypeNameTaken } from './queries';

/** The columns that a draft means, or why it cannot be: shared by adding and editing. */
export async function readDraft(tx: Tx, draft: ClassTypeDraft, except: number | null) {
	if (await isClassTypeNameTaken(draft.name, except, tx)) return refuse('name-taken');
	const gym = await currentGym(tx);
	if (!gym) return refuse('no-gym');
	const missing = await missingChoice(tx, draft);
	if (missing) return missing;
	const { cutOff, cutOffMin, cutOffClock, claims, price, programmeId, peoplePerCoach } = draft;
	return {
		ok: true as const,
		columns: {
			name: draft.name,
			about: draft.about,
			colour: draft.colour,
			lengthMin: draft.lengthMin,
			programmeId: programmeId ?? null,
			priceCents: toMinorUnits(price, gym.currency),
			whoMayBook: draft.whoMayBook,
			opensDaysBefore: draft.opensDaysBefore,
			closesMinBefore: draft.closesMinBefore,
			cutOffMin: cutOff === 'minutes' ? (cutOffMin ?? null) : null,
			cutOffClock: cutOff === 'clock' ? (cutOffClock ?? null) : null,
			peoplePerCoach: peoplePerCoach ?? null,
			defaultClaims: claims
		}
	};
}

async function missingChoice(
	tx: Tx,
	{ programmeId, claims }: ClassTypeDraft
): Promise<Refused<'unknown-group' | 'unknown-programme'> | null> {
	const choices = await classTypeChoices(tx);
	if (programmeId && !choices.programmes.some(({ id }) => id === programmeId)) {
		return refuse('unknown-programme');
	}
	const known = new Set(choices.kitGroups.map(({ id }) => id));
	return claims.every(({ kitGroupId }) => known.has(kitGroupId)) ? null : refuse('unknown-group');
}
