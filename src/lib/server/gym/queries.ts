import { db, type Queryable } from '../db';
import { gyms } from '../db/schema';

/** The gym's own settings, which every page needs. */
export type Gym = {
	name: string;
	placeName: string;
	zone: string;
	currency: string;
	locale: string;
	loadUnit: 'kg' | 'lb';
	/** ISO 8601: 1 is Monday, 7 is Sunday. */
	weekStartsOn: number;
	isDemo: boolean;
};

/** Null until the first run made the gym. */
export async function currentGym(q: Queryable = db): Promise<Gym | null> {
	const [gym] = await q
		.select({
			name: gyms.name,
			placeName: gyms.placeName,
			zone: gyms.zone,
			currency: gyms.currency,
			locale: gyms.locale,
			loadUnit: gyms.loadUnit,
			weekStartsOn: gyms.weekStartsOn,
			isDemo: gyms.isDemo
		})
		.from(gyms)
		.limit(1);
	return gym ?? null;
}
