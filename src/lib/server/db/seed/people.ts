import { addDays } from '$lib/domain/calendar/civil-date';
import type { Role } from '$lib/domain/people/capabilities';
import { hashPassword } from '../../auth/password';
import type { Tx } from '..';
import { ledgerEntries, ledgerTransfers, passes, people, personRoles } from '../schema';
import { firstNames, lastNames, notes, staff } from './people-data';
import type { Random } from './random';

export const demoPassword = 'ropewalk-demo';
export type SeedPass = {
	id: number;
	kind: 'membership' | 'pack';
	perWeek: number | null;
	left: number;
	startsOn: string;
	endsOn: string | null;
};
export type SeedMember = { id: number; name: string; pass: SeedPass | null };
export type SeededPeople = { staffIds: Record<string, number>; members: SeedMember[] };

/** Staff, `member@` and `member001@` to `member125@` with their passes: 126 members, one password. */
export async function addPeople(
	tx: Tx,
	{ now, todayOn, random }: { now: number; todayOn: string; random: Random }
): Promise<SeededPeople> {
	const passwordHash = await hashPassword(demoPassword);
	const add = async (key: string, name: string, roles: readonly Role[], note: string | null) => {
		const email = `${key}@ropewalk.example`;
		const [row] = await tx
			.insert(people)
			.values({ name, email, passwordHash, emailVerifiedAt: now, note, createdAt: now })
			.returning({ id: people.id });
		await tx
			.insert(personRoles)
			.values(roles.map((role) => ({ personId: row!.id, role, grantedAt: now })));
		return row!.id;
	};
	const staffIds: Record<string, number> = {};
	for (const { key, name, roles } of staff) staffIds[key] = await add(key, name, roles, null);

	const members: SeedMember[] = [];
	const names = new Set(['Sorcha Finnerty']);
	for (let i = 0; i <= 125; i += 1) {
		let name = 'Sorcha Finnerty';
		while (i > 0 && names.has(name)) name = `${random.pick(firstNames)} ${random.pick(lastNames)}`;
		names.add(name);
		const key = i === 0 ? 'member' : `member${String(i).padStart(3, '0')}`;
		const note = i > 0 && random.next() < 0.08 ? random.pick(notes) : null;
		const id = await add(key, name, ['member'], note);
		members.push({
			id,
			name,
			pass: await addPass(tx, id, i, todayOn, now, staffIds.desk!, random)
		});
	}
	return { staffIds, members };
}

/** The member of the demo has a pack; of the others most a membership, some a pack, few nothing. */
async function addPass(
	tx: Tx,
	personId: number,
	i: number,
	todayOn: string,
	now: number,
	byId: number,
	random: Random
): Promise<SeedPass | null> {
	const kind = i === 0 ? 0.75 : random.next();
	if (kind > 0.95) return null;
	const startsOn = addDays(todayOn, -60 - random.below(200));
	const isPack = kind > 0.7;
	const perWeek = isPack || kind < 0.3 ? null : kind < 0.5 ? 3 : 2;
	const isOver = i > 120;
	const endsOn = isOver
		? addDays(todayOn, -3 - random.below(20))
		: isPack
			? addDays(todayOn, 60 + random.below(60))
			: null;
	const name = isPack
		? 'Pack of 20'
		: perWeek === null
			? 'Membership, unlimited'
			: `Membership, ${perWeek} a week`;
	const [row] = await tx
		.insert(passes)
		.values({
			personId,
			kind: isPack ? 'pack' : 'membership',
			name,
			perWeek,
			startsOn,
			endsOn,
			createdAt: now,
			createdById: byId
		})
		.returning({ id: passes.id });
	if (isPack) await grant(tx, row!.id, 20, now, byId);
	return { id: row!.id, kind: isPack ? 'pack' : 'membership', perWeek, left: 20, startsOn, endsOn };
}

async function grant(
	tx: Tx,
	passId: number,
	credits: number,
	now: number,
	byId: number
): Promise<void> {
	const [transfer] = await tx
		.insert(ledgerTransfers)
		.values({ kind: 'grant', at: now, byId })
		.returning({ id: ledgerTransfers.id });
	await tx.insert(ledgerEntries).values([
		{ transferId: transfer!.id, account: `pass:${passId}`, unit: 'credit', amount: credits },
		{ transferId: transfer!.id, account: 'issued', unit: 'credit', amount: -credits }
	]);
}
