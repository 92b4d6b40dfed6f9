import type { Prescription } from '$lib/domain/training';
import * as m from './compiled/messages';

export type Amount = Pick<
	Prescription,
	'sets' | 'reps' | 'seconds' | 'metres' | 'calories' | 'perSide'
>;

/** "4 × 8 a side", "40 s", "200 m": what is typed, and no more. */
export function amountWords({ sets, reps, seconds, metres, calories, perSide }: Amount): string {
	const work =
		reps !== undefined
			? String(reps)
			: seconds !== undefined
				? m.member_seconds({ seconds })
				: metres !== undefined
					? m.member_metres({ metres })
					: calories !== undefined
						? m.coach_calories({ calories })
						: '';
	const amount = sets !== undefined && work ? `${sets} × ${work}` : work;
	return perSide && amount ? m.member_per_side({ amount }) : amount;
}
