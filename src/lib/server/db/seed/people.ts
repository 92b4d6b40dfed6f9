import { addDays } from '$lib/domain/calendar/civil-date';
import { hashPassword } from '../../auth/password';
import type { Tx } from '..';
import { passes, people, personRoles } from '../schema';
import { insertAll } from './insert-all';
import {
	firstMembers,
	notes,
	origins,
	packCredits,
	passKinds,
	staff,
	type PassKind,
	type StaffKey
} from './people-data';
import type { Random } from './random';
import type { Records } from './records';

export const demoPassword = 'ropewalk-demo';

export type SeedPass = {
	id: number;
	kind: 'membership' | 'pack';
	perWeek: number | null;
	startsOn: string;
	endsOn: string | null;
	createdAt: number;
};
export const hourNames = ['early', 'morning', 'lunch', 'evening'] as const;
export type Hour = (typeof hourNames)[number];

/** A member with the habits that their bookings follow from. */
export type SeedMember = {
	id: number;
	joinedAt: number;
	passes: SeedPass[];
	/** 0 is new to it, 1 does everything as written and more. */
	level: number;
	/** Classes a week that they would come to. */
	keen: number;
	favourite: Hour;
	second: Hour;
	/** Days of the week on which they come: 0 is Monday, 5 Saturday. */
	days: number[];
};
export type Staff = Record<StaffKey, number>;
type When = { now: number; todayOn: string; random: Random; records: Records };

const accounts = 121;
/** With the head coach and a coach, who train too, 126 hold the role of member. */
const withoutAddress = 3;
const hourMs = 3_600_000;

/** Staff, then `member@`, `member001@` to `member120@`, and a few whom the desk entered. */
export async function addPeople(
	tx: Tx,
	when: When
): Promise<{ staffIds: Staff; members: SeedMember[] }> {
	const passwordHash = await hashPassword(demoPassword);
	const openedAt = Date.parse(addDays(when.todayOn, -730)) + 9 * hourMs;
	const staffIds = Object.fromEntries(staff.map(({ key }, i) => [key, i + 1])) as Staff;
	const rows: (typeof people.$inferInsert)[] = staff.map(({ key, name }) => ({
		id: staffIds[key],
		name,
		email: `${key}@ropewalk.example`,
		phone: phone(when.random),
		passwordHash,
		emailVerifiedAt: openedAt,
		createdAt: openedAt
	}));
	const shop = new PassShop(when, staffIds.desk);
	for (const key of ['head', 'coach'] as const)
		shop.sell(staffIds[key], 'staff', addDays(when.todayOn, -700));

	const members: SeedMember[] = [];
	const names = new Set<string>(rows.map(({ name }) => name));
	for (let i = 0; i < accounts + withoutAddress; i += 1) {
		const id = staff.length + 1 + i;
		const member = newMember(id, i, when, shop);
		const hasAccount = i < accounts;
		members.push(member);
		rows.push({
			id,
			name: newName(i, names, when.random),
			email: hasAccount ? `${accountName(i)}@ropewalk.example` : null,
			phone: when.random.next() < 0.7 ? phone(when.random) : null,
			passwordHash: hasAccount ? passwordHash : null,
			emailVerifiedAt: hasAccount ? member.joinedAt : null,
			note: i > 0 && when.random.next() < 0.08 ? when.random.pick(notes) : null,
			createdAt: member.joinedAt,
			createdById: hasAccount ? null : staffIds.desk
		});
	}
	await insertAll(tx, people, rows);
	const rolesOf = new Map(staff.map(({ key, roles }) => [staffIds[key], roles]));
	const held = rows.flatMap(({ id, createdAt }) =>
		(rolesOf.get(id!) ?? ['member' as const]).map((role) => ({
			personId: id!,
			role,
			grantedAt: createdAt
		}))
	);
	await insertAll(tx, personRoles, held);
	await insertAll(tx, passes, shop.rows);
	return { staffIds, members };
}

const accountName = (i: number) => (i === 0 ? 'member' : `member${String(i).padStart(3, '0')}`);

function newName(i: number, taken: Set<string>, random: Random): string {
	for (;;) {
		const name = firstMembers[i] ?? madeUpName(random);
		if (taken.has(name)) continue;
		taken.add(name);
		return name;
	}
}

function madeUpName(random: Random): string {
	let left = random.next();
	const origin = origins.find(({ share }) => (left -= share) < 0) ?? origins[0]!;
	return `${random.pick(origin.first)} ${random.pick(origin.last)}`;
}

/** Numbers that the Irish regulator keeps for fiction (020 91x xxxx, from memory). */
const phone = (random: Random) =>
	`+353 20 91${1000 + random.below(9000)}`.replace(/(.{4})$/, ' $1');

function newMember(id: number, i: number, when: When, shop: PassShop): SeedMember {
	const { random, todayOn } = when;
	const isNew = i > 0 && random.next() < 0.07;
	const joinedOn = addDays(todayOn, -(isNew ? 3 + random.below(11) : 62 + random.below(600)));
	const favourite = hourNames[pickByShare([0.22, 0.14, 0.12, 0.52], random)]!;
	const member: SeedMember = {
		id,
		joinedAt: Date.parse(joinedOn) + (9 + random.below(10)) * hourMs,
		passes: [],
		level: i === 0 ? 0.6 : isNew ? random.next() * 0.3 : random.next(),
		keen: i === 0 ? 2 : 3 + random.below(3),
		favourite: i === 0 ? 'evening' : favourite,
		second: i === 0 ? 'evening' : hourNames[pickByShare([0.2, 0.25, 0.15, 0.4], random)]!,
		days: random.shuffled([0, 1, 2, 3, 4, 5])
	};
	member.passes = passesFor(id, i, joinedOn, when, shop);
	const [pass] = member.passes;
	if (i > 0 && pass?.perWeek) member.keen = pass.perWeek;
	if (i > 0 && pass?.kind === 'pack') member.keen = 1 + random.below(2);
	member.days = i === 0 ? [1, 3] : member.days.slice(0, member.keen);
	return member;
}

function pickByShare(shares: number[], random: Random): number {
	let left = random.next();
	return Math.max(
		0,
		shares.findIndex((share) => (left -= share) < 0)
	);
}

/** `member@` is on a second pack. Most others hold a membership, some packs, a few what is over, a few nothing. */
function passesFor(
	id: number,
	i: number,
	joinedOn: string,
	{ todayOn, random }: When,
	shop: PassShop
): SeedPass[] {
	const daysAgo = (days: number) => {
		const on = addDays(todayOn, -days);
		return on > joinedOn ? on : joinedOn;
	};
	if (i === 0) return [shop.sell(id, 'pack', daysAgo(52)), shop.sell(id, 'pack', daysAgo(12))];
	const share = random.next();
	if (share < 0.75) {
		const kind: PassKind = share < 0.38 ? 'unlimited' : share < 0.6 ? 'three' : 'two';
		return [shop.sell(id, kind, joinedOn)];
	}
	if (share < 0.91) {
		const first = shop.sell(id, 'pack', daysAgo(38 + random.below(20)));
		const again = random.next() < 0.75;
		return again ? [first, shop.sell(id, 'pack', daysAgo(3 + random.below(18)))] : [first];
	}
	if (share < 0.96) {
		const endsOn = addDays(todayOn, -1 - random.below(2));
		const kind: PassKind = share < 0.935 ? 'two' : 'pack';
		return [shop.sell(id, kind, daysAgo(60), endsOn)];
	}
	return [];
}

/** Writes passes as the desk grants them: the row, a pack's credits, the audit log. */
class PassShop {
	readonly rows: (typeof passes.$inferInsert)[] = [];
	readonly #records: Records;
	constructor(
		when: When,
		private readonly deskId: number
	) {
		this.#records = when.records;
	}

	sell(personId: number, what: PassKind, startsOn: string, endsOn: string | null = null): SeedPass {
		const { kind, name, perWeek, priceCents } = passKinds[what];
		const id = this.rows.length + 1;
		const createdAt = Date.parse(startsOn) + 8 * hourMs;
		const lastOn = endsOn ?? (kind === 'pack' ? addDays(startsOn, 120) : null);
		const pass = { id, kind, perWeek, startsOn, endsOn: lastOn, createdAt };
		const byId = this.deskId;
		this.rows.push({ ...pass, personId, name, priceCents, createdById: byId });
		if (kind === 'pack') this.#records.grant(id, packCredits, { at: createdAt, byId });
		const detail = { personId, kind, name, perWeek, startsOn, endsOn: lastOn };
		this.#records.audit({
			at: createdAt,
			byId,
			verb: 'passes.grant',
			noun: 'passes',
			nounId: id,
			detail
		});
		return pass;
	}
}
