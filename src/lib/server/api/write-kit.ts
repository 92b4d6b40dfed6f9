import type { z } from 'zod';
import type { KitOfSlot } from '../slots/kit-of';
import type { kitShape } from './shapes';
import { isoIn } from './write-slot';

/** The kit of a slot as the API answers it to staff. */
export function writeKit(kit: KitOfSlot, zone: string): z.infer<typeof kitShape> {
	const { places, lanes, clockAt, library } = kit;
	const { bottleneck, asWritten, withRegressions } = places;
	const at = (seconds: number) => isoIn(clockAt + seconds * 1000, zone);
	return {
		limit: places.limit,
		limitedWithRegressions: Math.max(places.limit, withRegressions),
		limitedBy: places.limitedBy,
		bottleneck: bottleneck && {
			item: library.groups[bottleneck.group]?.plural ?? bottleneck.group,
			from: at(bottleneck.from),
			to: at(bottleneck.to),
			short: bottleneck.short
		},
		lanes: lanes.map(({ name, inService, claims }) => ({
			item: name,
			inService,
			claims: claims.map(({ slotId, from, to, count }) => ({
				slotId,
				from: isoIn(from, zone),
				to: isoIn(to, zone),
				count
			}))
		})),
		remedies: bottleneck ? remedies(asWritten, withRegressions) : []
	};
}

/** What can be said without changing anything laid: hold places at the kit, or let later people go down a rung. */
function remedies(asWritten: number, withRegressions: number) {
	const cap = { kind: 'cap-places', places: asWritten, people: 0 };
	const more = withRegressions - asWritten;
	return more > 0 ? [{ kind: 'regressions', places: withRegressions, people: more }, cap] : [cap];
}
