import { eq } from 'drizzle-orm';
import { refuse, type Refused } from '$lib/domain/refusal';
import type { GymSettings } from '$lib/forms/gym';
import { audit } from '../audit/record';
import { write } from '../db';
import { gyms, series } from '../db/schema';
import type { Viewer } from '../guard';
import { currentGym } from './queries';

/**
 * Changes the gym's own settings. The zone stays once there are series: their slots hold
 * instants that were worked out in it.
 */
export async function changeSettings(
	viewer: Viewer,
	settings: GymSettings,
	{ now }: { now: number }
): Promise<{ ok: true } | Refused<'no-gym' | 'zone-in-use'>> {
	return write(async (tx) => {
		const before = await currentGym(tx);
		if (!before) return refuse('no-gym');
		if (settings.zone !== before.zone) {
			const [used] = await tx.select({ id: series.id }).from(series).limit(1);
			if (used) return refuse('zone-in-use');
		}
		await tx.update(gyms).set(settings).where(eq(gyms.id, 1));
		await audit(tx, {
			viewer,
			verb: 'gym.change-settings',
			noun: 'gyms',
			nounId: 1,
			now,
			detail: changed(before, settings)
		});
		return { ok: true };
	});
}

/** Only what differs, as [before, after]. */
const changed = (before: GymSettings | Record<string, unknown>, after: GymSettings) =>
	Object.fromEntries(
		Object.entries(after).flatMap(([key, value]) => {
			const was = (before as Record<string, unknown>)[key];
			return was === value ? [] : [[key, [was, value]]];
		})
	);
