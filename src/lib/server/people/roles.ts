import { and, eq, isNull } from 'drizzle-orm';
import type { Role } from '$lib/domain/people/capabilities';
import { refuse, type Refused } from '$lib/domain/refusal';
import { audit } from '../audit/record';
import { revokeSignInsOf } from '../auth/revoke';
import { write, type Tx } from '../db';
import { people, personRoles } from '../db/schema';
import type { Viewer } from '../guard';

type Change = { personId: number; role: Role };
type Done = { ok: true };

/** Grants a role. Sign-ins of the person end: the next one is bound by what they may do now. */
export async function grantRole(
	viewer: Viewer,
	{ personId, role }: Change,
	{ now }: { now: number }
): Promise<Done | Refused<'not-found'>> {
	return write(async (tx) => {
		if (!(await exists(tx, personId))) return refuse('not-found');
		const [granted] = await tx
			.insert(personRoles)
			.values({ personId, role, grantedAt: now, grantedById: viewer.personId })
			.onConflictDoNothing()
			.returning();
		if (!granted) return { ok: true };
		await revokeSignInsOf(tx, personId, now, viewer.signInId);
		const fact = { viewer, verb: 'people.grant-role', noun: 'people', nounId: personId };
		await audit(tx, { ...fact, now, detail: { role } });
		return { ok: true };
	});
}

/** Takes a role away, at their next request. The last owner keeps theirs. */
export async function revokeRole(
	viewer: Viewer,
	{ personId, role }: Change,
	{ now }: { now: number }
): Promise<Done | Refused<'not-found' | 'last-owner'>> {
	return write(async (tx) => {
		if (!(await exists(tx, personId))) return refuse('not-found');
		if (role === 'owner' && (await isLastOwner(tx, personId))) return refuse('last-owner');
		const [revoked] = await tx
			.delete(personRoles)
			.where(and(eq(personRoles.personId, personId), eq(personRoles.role, role)))
			.returning();
		if (!revoked) return { ok: true };
		await revokeSignInsOf(tx, personId, now, viewer.signInId);
		const fact = { viewer, verb: 'people.revoke-role', noun: 'people', nounId: personId };
		await audit(tx, { ...fact, now, detail: { role } });
		return { ok: true };
	});
}

async function exists(tx: Tx, personId: number): Promise<boolean> {
	const [row] = await tx.select({ id: people.id }).from(people).where(eq(people.id, personId));
	return row !== undefined;
}

/** Whether no other owner could still sign in. */
export async function isLastOwner(tx: Tx, personId: number): Promise<boolean> {
	const owners = await tx
		.select({ id: people.id })
		.from(personRoles)
		.innerJoin(people, eq(people.id, personRoles.personId))
		.where(and(eq(personRoles.role, 'owner'), isNull(people.disabledAt)));
	return owners.length === 1 && owners[0]?.id === personId;
}
