import { and, eq, isNull, ne } from 'drizzle-orm';
import { refuse, type Refused } from '$lib/domain/refusal';
import { audit } from '../audit/record';
import { db, write } from '../db';
import { people, personRoles } from '../db/schema';
import type { Viewer } from '../guard';

type Actor = Pick<Viewer, 'personId'>;
export type MemberInput = { name: string; email: string | null; phone: string | null };
export type MemberRow = MemberInput & { id: number; createdAt: number };

export async function memberById(id: number): Promise<MemberRow | null> {
	const row = await db
		.select({
			id: people.id,
			name: people.name,
			email: people.email,
			phone: people.phone,
			createdAt: people.createdAt
		})
		.from(people)
		.where(and(eq(people.id, id), isNull(people.disabledAt)))
		.get();
	return row ?? null;
}

/** Adds a member at the desk; an address is not needed, and lets them sign in by link later. */
export function addMember(
	viewer: Actor,
	input: MemberInput,
	{ now }: { now: number }
): Promise<{ ok: true; id: number } | Refused<'email-taken'>> {
	return write(async (tx) => {
		if (input.email !== null) {
			const taken = await tx
				.select({ id: people.id })
				.from(people)
				.where(eq(people.email, input.email))
				.get();
			if (taken) return refuse('email-taken');
		}
		const { id } = await tx
			.insert(people)
			.values({ ...input, createdAt: now, createdById: viewer.personId })
			.returning({ id: people.id })
			.get();
		await tx
			.insert(personRoles)
			.values({ personId: id, role: 'member', grantedAt: now, grantedById: viewer.personId });
		await audit(tx, { viewer, verb: 'people.add', noun: 'people', nounId: id, now });
		return { ok: true, id };
	});
}

/** Changes a member's details. Staff's own are the owner's to change. */
export function changeMember(
	viewer: Actor,
	id: number,
	input: MemberInput,
	{ now }: { now: number }
): Promise<{ ok: true } | Refused<'not-found' | 'email-taken' | 'not-allowed'>> {
	return write(async (tx) => {
		const there = await tx.select({ id: people.id }).from(people).where(eq(people.id, id)).get();
		if (!there) return refuse('not-found');
		const staff = await tx
			.select({ role: personRoles.role })
			.from(personRoles)
			.where(and(eq(personRoles.personId, id), ne(personRoles.role, 'member')));
		if (staff.length > 0) return refuse('not-allowed');
		if (input.email !== null) {
			const taken = await tx
				.select({ id: people.id })
				.from(people)
				.where(and(eq(people.email, input.email), ne(people.id, id)))
				.get();
			if (taken) return refuse('email-taken');
		}
		await tx.update(people).set(input).where(eq(people.id, id));
		await audit(tx, { viewer, verb: 'people.change', noun: 'people', nounId: id, now });
		return { ok: true };
	});
}
