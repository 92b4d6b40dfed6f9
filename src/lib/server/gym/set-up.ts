import { isWeakPassword } from '$lib/domain/people/password';
import { refuse, type Refused } from '$lib/domain/refusal';
import type { FirstRun } from '$lib/forms/first-run';
import { audit } from '../audit/record';
import { mayTryFirstRun } from '../auth/limits';
import { hashPassword } from '../auth/password';
import { write, type Tx } from '../db';
import { addStarterLibrary } from '../db/seed/starter';
import { gyms, people, personRoles, rooms } from '../db/schema';
import { forgetFirstRunCode, isFirstRunCode } from './first-run-code';
import { currentGym } from './queries';

/** The first run: makes the gym with its rooms, its owner and a starter library, or nothing. */
export async function setUpGym(
	{ code, gym, rooms: given, owner }: FirstRun,
	{ now }: { now: number }
): Promise<
	{ ok: true } | Refused<'wrong-code' | 'too-many-tries' | 'weak-password' | 'gym-exists'>
> {
	if (!(await mayTryFirstRun())) return refuse('too-many-tries');
	if (!isFirstRunCode(code)) return refuse('wrong-code');
	if (isWeakPassword(owner.password, [owner.name, owner.email, gym.name])) {
		return refuse('weak-password');
	}
	const passwordHash = await hashPassword(owner.password);
	const made = await write(async (tx) => {
		if (await currentGym(tx)) return refuse('gym-exists');
		await tx.insert(gyms).values({ id: 1, ...gym, createdAt: now });
		await tx
			.insert(rooms)
			.values(given.map((room, position) => ({ ...room, position, createdAt: now })));
		const personId = await addOwner(tx, { ...owner, passwordHash }, now);
		await addStarterLibrary(tx, { now });
		const viewer = { personId };
		await audit(tx, { viewer, verb: 'gym.set-up', noun: 'gyms', nounId: 1, now });
		return { ok: true as const };
	});
	if (made.ok) forgetFirstRunCode();
	return made;
}

async function addOwner(
	tx: Tx,
	owner: { name: string; email: string; passwordHash: string },
	now: number
): Promise<number> {
	const { name, email, passwordHash } = owner;
	const [person] = await tx
		.insert(people)
		.values({ name, email, passwordHash, emailVerifiedAt: now, createdAt: now })
		.returning({ id: people.id });
	if (!person) throw new Error('the owner was not written');
	await tx.insert(personRoles).values({ personId: person.id, role: 'owner', grantedAt: now });
	return person.id;
}
