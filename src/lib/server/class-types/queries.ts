import { and, asc, count, eq, gt, isNull, or } from 'drizzle-orm';
import { db, type Queryable } from '../db';
import { classTypes, kitGroups, programmes, series, slots } from '../db/schema';

export type ClassType = typeof classTypes.$inferSelect;

/** A class type in the list, with what hangs on it. */
export type ClassTypeRow = Pick<
	ClassType,
	'id' | 'name' | 'about' | 'colour' | 'lengthMin' | 'priceCents' | 'whoMayBook' | 'archivedAt'
> & { programme: string | null; series: number; slotsAhead: number };

/** Every class type by name, archived ones last. */
export async function listClassTypes(now: number, q: Queryable = db): Promise<ClassTypeRow[]> {
	const all = await q
		.select({ type: classTypes, programme: programmes.name })
		.from(classTypes)
		.leftJoin(programmes, eq(programmes.id, classTypes.programmeId))
		.orderBy(asc(classTypes.name));
	const ofSeries = await q
		.select({ id: series.classTypeId, n: count() })
		.from(series)
		.where(or(isNull(series.endedAt), gt(series.endedAt, now)))
		.groupBy(series.classTypeId);
	const ahead = await q
		.select({ id: slots.classTypeId, n: count() })
		.from(slots)
		.where(and(gt(slots.startsAt, now), isNull(slots.cancelledAt)))
		.groupBy(slots.classTypeId);
	const numberOf = (rows: { id: number; n: number }[], id: number) =>
		rows.find((row) => row.id === id)?.n ?? 0;
	return all
		.map(({ type, programme }) => ({
			id: type.id,
			name: type.name,
			about: type.about,
			colour: type.colour,
			lengthMin: type.lengthMin,
			priceCents: type.priceCents,
			whoMayBook: type.whoMayBook,
			archivedAt: type.archivedAt,
			programme,
			series: numberOf(ofSeries, type.id),
			slotsAhead: numberOf(ahead, type.id)
		}))
		.sort((x, y) => Number(x.archivedAt !== null) - Number(y.archivedAt !== null));
}

export async function findClassType(id: number, q: Queryable = db): Promise<ClassType | null> {
	const [type] = await q.select().from(classTypes).where(eq(classTypes.id, id));
	return type ?? null;
}

/** Whether another class type has this name. */
export async function isClassTypeNameTaken(
	name: string,
	except: number | null,
	q: Queryable = db
): Promise<boolean> {
	const all = await q.select({ id: classTypes.id, name: classTypes.name }).from(classTypes);
	return all.some((type) => type.id !== except && type.name.toLowerCase() === name.toLowerCase());
}

/** What the class type's form chooses from. */
export type ClassTypeChoices = {
	programmes: { id: number; name: string }[];
	kitGroups: { id: number; name: string }[];
};

export async function classTypeChoices(q: Queryable = db): Promise<ClassTypeChoices> {
	return {
		programmes: await q
			.select({ id: programmes.id, name: programmes.name })
			.from(programmes)
			.where(isNull(programmes.archivedAt))
			.orderBy(asc(programmes.position), asc(programmes.id)),
		kitGroups: await q
			.select({ id: kitGroups.id, name: kitGroups.name })
			.from(kitGroups)
			.where(isNull(kitGroups.archivedAt))
			.orderBy(asc(kitGroups.position), asc(kitGroups.id))
	};
}
