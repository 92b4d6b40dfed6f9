import { and, desc, eq, gte, lt, like, or, type AnyColumn, type SQL } from 'drizzle-orm';
import { alias } from 'drizzle-orm/sqlite-core';
import { db } from '../db';
import { auditEntries, bookings, classTypes, people, slots } from '../db/schema';

export type AuditRow = {
	id: number;
	at: number;
	who: string | null;
	verb: string;
	noun: string;
	nounId: number | null;
	/** The name of the person that it is about, where it is about one. */
	about: string | null;
	/** The class that it is about, or whose booking. */
	className: string | null;
	classAt: number | null;
	detail: Record<string, unknown>;
};

export type AuditFilter = {
	/** Entries older than this one: the page after it. */
	before?: number;
	/** Instants; `to` is left out. */
	from?: number;
	to?: number;
	actorId?: number;
	/** The start of a verb: "kit" finds "kit.add-item". */
	verb?: string;
};

const about = alias(people, 'about');

export const auditPageSize = 50;

/** One page of the log, newest first, and one row more when there are older ones. */
export async function listAudit(filter: AuditFilter): Promise<AuditRow[]> {
	const conditions: (SQL | undefined)[] = [
		filter.before === undefined ? undefined : lt(auditEntries.id, filter.before),
		filter.from === undefined ? undefined : gte(auditEntries.at, filter.from),
		filter.to === undefined ? undefined : lt(auditEntries.at, filter.to),
		filter.actorId === undefined ? undefined : eq(auditEntries.actorId, filter.actorId),
		filter.verb ? like(auditEntries.verb, `${filter.verb}%`) : undefined
	];
	return db
		.select({
			id: auditEntries.id,
			at: auditEntries.at,
			who: people.name,
			verb: auditEntries.verb,
			noun: auditEntries.noun,
			nounId: auditEntries.nounId,
			about: about.name,
			className: classTypes.name,
			classAt: slots.startsAt,
			detail: auditEntries.detail
		})
		.from(auditEntries)
		.leftJoin(people, eq(people.id, auditEntries.actorId))
		.leftJoin(bookings, rowOf('bookings', bookings.id))
		.leftJoin(about, or(rowOf('people', about.id), eq(about.id, bookings.personId)))
		.leftJoin(slots, or(rowOf('slots', slots.id), eq(slots.id, bookings.slotId)))
		.leftJoin(classTypes, eq(classTypes.id, slots.classTypeId))
		.where(and(...conditions))
		.orderBy(desc(auditEntries.id))
		.limit(auditPageSize + 1);
}

/** The row that an entry is about, where it is of that table. */
const rowOf = (noun: string, id: AnyColumn) =>
	and(eq(auditEntries.noun, noun), eq(id, auditEntries.nounId));

/** Everybody who stands in the log, for the filter. */
export async function listActors(): Promise<{ id: number; name: string }[]> {
	return db
		.selectDistinct({ id: people.id, name: people.name })
		.from(auditEntries)
		.innerJoin(people, eq(people.id, auditEntries.actorId))
		.orderBy(people.name);
}

/** The areas that verbs begin with: "kit", "people". */
export async function listAreas(): Promise<string[]> {
	const verbs = await db.selectDistinct({ verb: auditEntries.verb }).from(auditEntries);
	return [...new Set(verbs.map(({ verb }) => verb.split('.')[0] ?? verb))].sort();
}
