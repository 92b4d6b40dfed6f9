import { eq } from 'drizzle-orm';
import type { Invitation } from '$lib/forms/staff';
import { roleName } from '$lib/wording/roles';
import { audit } from '../audit/record';
import { revokeSignInsOf } from '../auth/revoke';
import { write, type Tx } from '../db';
import { people, personRoles } from '../db/schema';
import { env } from '../env';
import type { Viewer } from '../guard';
import { currentGym } from '../gym/queries';
import { invitationLetter } from '../messages/account-letters';
import { queueMessage } from '../messages/queue';

/**
 * Gives somebody a role by their mail address: an account that is there gets it, else one is
 * made, without a password. Either way they are told.
 */
export async function invite(
	viewer: Viewer,
	invitation: Invitation,
	{ now }: { now: number }
): Promise<{ ok: true; personId: number }> {
	return write(async (tx) => {
		const personId = await findOrMake(tx, viewer, invitation, now);
		const [granted] = await tx
			.insert(personRoles)
			.values({ personId, role: invitation.role, grantedAt: now, grantedById: viewer.personId })
			.onConflictDoNothing()
			.returning();
		if (!granted) return { ok: true, personId };
		await revokeSignInsOf(tx, personId, now, viewer.signInId);
		await tell(tx, viewer, { ...invitation, personId, now });
		await audit(tx, {
			viewer,
			verb: 'people.invite',
			noun: 'people',
			nounId: personId,
			now,
			detail: { role: invitation.role }
		});
		return { ok: true, personId };
	});
}

async function findOrMake(
	tx: Tx,
	viewer: Viewer,
	{ name, email }: Invitation,
	now: number
): Promise<number> {
	const [known] = await tx.select({ id: people.id }).from(people).where(eq(people.email, email));
	if (known) return known.id;
	const [made] = await tx
		.insert(people)
		.values({ name, email, createdAt: now, createdById: viewer.personId })
		.returning({ id: people.id });
	if (!made) throw new Error('the person was not written');
	return made.id;
}

async function tell(
	tx: Tx,
	viewer: Viewer,
	to: Invitation & { personId: number; now: number }
): Promise<void> {
	const gymName = (await currentGym(tx))?.name ?? '';
	await queueMessage(tx, {
		kind: 'invitation',
		to: to.email,
		personId: to.personId,
		factKey: `invitation:${to.personId}:${to.role}:${to.now}`,
		now: to.now,
		...invitationLetter({
			name: to.name,
			gymName,
			inviter: viewer.name,
			role: roleName(to.role),
			href: `${env().origin}/sign-in`
		})
	});
}
