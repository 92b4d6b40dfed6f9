import { asc, eq, inArray, max, ne } from 'drizzle-orm';
import type { Role } from '$lib/domain/people/capabilities';
import { db } from '../db';
import { people, personRoles, signIns } from '../db/schema';

export type StaffRow = {
	id: number;
	name: string;
	email: string | null;
	isShut: boolean;
	roles: Role[];
	lastSeenAt: number | null;
};

/** Everybody who holds a role besides that of a member, by name. */
export async function listStaff(): Promise<StaffRow[]> {
	const staff = db
		.select({ id: personRoles.personId })
		.from(personRoles)
		.where(ne(personRoles.role, 'member'));
	const [rows, seen] = await Promise.all([
		db
			.select({
				id: people.id,
				name: people.name,
				email: people.email,
				disabledAt: people.disabledAt,
				role: personRoles.role
			})
			.from(people)
			.innerJoin(personRoles, eq(personRoles.personId, people.id))
			.where(inArray(people.id, staff))
			.orderBy(asc(people.name), asc(people.id)),
		db
			.select({ personId: signIns.personId, at: max(signIns.lastSeenAt) })
			.from(signIns)
			.where(inArray(signIns.personId, staff))
			.groupBy(signIns.personId)
	]);
	const lastSeen = new Map(seen.map((row) => [row.personId, row.at]));
	const byId = new Map<number, StaffRow>();
	for (const { role, disabledAt, ...person } of rows) {
		const row = byId.get(person.id) ?? {
			...person,
			isShut: disabledAt !== null,
			roles: [],
			lastSeenAt: lastSeen.get(person.id) ?? null
		};
		row.roles.push(role);
		byId.set(person.id, row);
	}
	return [...byId.values()];
}
