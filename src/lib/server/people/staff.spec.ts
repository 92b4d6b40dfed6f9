import { eq } from 'drizzle-orm';
import { beforeEach, describe, expect, it } from 'vitest';
import { useDatabase } from '../../../../tests/support/database';
import { viewerOf } from '../../../../tests/support/viewer';
import { addPerson } from '../../../../tests/support/people';
import { recordSignIn } from '../auth/record-sign-in';
import { db } from '../db';
import { auditEntries, outboxMessages, people, personRoles, signIns } from '../db/schema';
import type { Viewer } from '../guard';
import { invite } from './invite';
import { grantRole, revokeRole } from './roles';
import { reopenAccount, shutAccount } from './shut';
import { listStaff } from './staff';

const now = 1_800_000_000_000;
const device = { userAgent: null, address: '127.0.0.1' };

describe('who works at the gym', () => {
	useDatabase();
	let owner: Viewer;
	let member: number;
	beforeEach(async () => {
		owner = await viewerOf(await addPerson('owner@gym.test', ['owner']));
		member = await addPerson('member@gym.test', ['member']);
	});

	const rolesOf = async (personId: number) =>
		(await db.select().from(personRoles).where(eq(personRoles.personId, personId)))
			.map((row) => row.role)
			.sort();
	const liveSignIns = async (personId: number) =>
		(await db.select().from(signIns).where(eq(signIns.personId, personId))).filter(
			(row) => row.revokedAt === null
		).length;
	const verbs = async () => (await db.select().from(auditEntries)).map((row) => row.verb);

	it('gains somebody new by mail: an account without a password, the role, and a letter', async () => {
		const form = { name: 'Ada', email: 'ada@gym.test', role: 'coach' as const };
		const { personId } = await invite(owner, form, { now });
		expect(await rolesOf(personId)).toEqual(['coach']);
		const [row] = await db.select().from(people).where(eq(people.id, personId));
		expect(row).toMatchObject({ name: 'Ada', passwordHash: null, emailVerifiedAt: null });
		const [letter] = await db.select().from(outboxMessages);
		expect(letter).toMatchObject({ toAddress: 'ada@gym.test', kind: 'invitation' });
		expect(letter?.text).toContain('as Coach');
		expect(await verbs()).toEqual(['people.invite']);
	});

	it('keeps a member who is invited: same person, one role more', async () => {
		const form = { name: 'Other', email: 'member@gym.test', role: 'front_desk' as const };
		const { personId } = await invite(owner, form, { now });
		expect(personId).toBe(member);
		expect(await rolesOf(member)).toEqual(['front_desk', 'member']);
		const [row] = await db.select().from(people).where(eq(people.id, member));
		expect(row?.name).toBe('member');
	});

	it('ends the sign-ins of whoever gains or loses a role, and says so in the log', async () => {
		await recordSignIn(member, device, { now, replaces: null });
		await grantRole(owner, { personId: member, role: 'coach' }, { now });
		expect(await liveSignIns(member)).toBe(0);
		await recordSignIn(member, device, { now, replaces: null });
		await revokeRole(owner, { personId: member, role: 'coach' }, { now });
		expect(await liveSignIns(member)).toBe(0);
		expect(await rolesOf(member)).toEqual(['member']);
		expect(await verbs()).toEqual(['people.grant-role', 'people.revoke-role']);
	});

	it('writes nothing when nothing changes', async () => {
		await grantRole(owner, { personId: member, role: 'member' }, { now });
		await revokeRole(owner, { personId: member, role: 'coach' }, { now });
		expect(await verbs()).toEqual([]);
	});

	it('never loses its last owner', async () => {
		const refused = { ok: false, refused: 'last-owner' };
		const change = { personId: owner.personId, role: 'owner' as const };
		expect(await revokeRole(owner, change, { now })).toEqual(refused);
		const second = await viewerOf(await addPerson('second@gym.test', ['owner']));
		expect(await shutAccount(owner, second.personId, { now })).toEqual({ ok: true });
		expect(await revokeRole(owner, change, { now })).toEqual(refused);
		expect(await shutAccount(second, owner.personId, { now })).toEqual(refused);
		expect(await rolesOf(owner.personId)).toEqual(['owner']);
	});

	it('shuts an account at once, opens it again, and nobody shuts their own', async () => {
		await recordSignIn(member, device, { now, replaces: null });
		expect(await shutAccount(owner, member, { now })).toEqual({ ok: true });
		expect(await liveSignIns(member)).toBe(0);
		expect(await reopenAccount(owner, member, { now })).toEqual({ ok: true });
		expect(await shutAccount(owner, owner.personId, { now })).toEqual({
			ok: false,
			refused: 'yourself'
		});
		expect(await verbs()).toEqual(['people.shut', 'people.reopen']);
	});

	it('answers not-found for nobody', async () => {
		const nobody = { ok: false, refused: 'not-found' };
		expect(await grantRole(owner, { personId: 999, role: 'coach' }, { now })).toEqual(nobody);
		expect(await revokeRole(owner, { personId: 999, role: 'coach' }, { now })).toEqual(nobody);
		expect(await shutAccount(owner, 999, { now })).toEqual(nobody);
		expect(await reopenAccount(owner, 999, { now })).toEqual(nobody);
	});

	it('lists staff with their roles and not the members', async () => {
		await recordSignIn(owner.personId, device, { now, replaces: null });
		expect(await listStaff()).toEqual([
			{
				id: owner.personId,
				name: 'owner',
				email: 'owner@gym.test',
				isShut: false,
				roles: ['owner'],
				lastSeenAt: now
			}
		]);
	});
});
