import { instantOf } from '../../src/lib/domain/calendar';
import { capabilitiesOf, type Role } from '../../src/lib/domain/people/capabilities';
import type { SessionContent } from '../../src/lib/domain/training';
import { write } from '../../src/lib/server/db';
import {
	classTypes,
	gyms,
	kitGroups,
	kitItems,
	movements,
	passes,
	people,
	personRoles,
	rooms,
	sessionRevisions,
	slotCoaches,
	slots,
	trainingSessions,
	variationNeeds,
	variations
} from '../../src/lib/server/db/schema';
import { grantCredits } from '../../src/lib/server/passes/credits';

/** Tuesday 1 December 2026, 12:00 in Galway: the specs' now. */
export const specNow = Date.UTC(2026, 11, 1, 12);
export const specZone = 'Europe/Dublin';

export type SpecGym = {
	roomId: number;
	loftId: number;
	coachId: number;
	deskId: number;
	classTypeId: number;
	/** Pull-ups: strict (a bar place), then ring rows (rings), then the floor. */
	movementId: number;
	strictId: number;
	ringRowId: number;
	floorId: number;
	revisionId: number;
	prescriptionId: string;
};

/** A gym of one kind of class: two rooms, four bar places, two pairs of rings, a 60-minute session. */
export async function addSpecGym({ barPlaces = 4, rings = 2 } = {}): Promise<SpecGym> {
	return write(async (tx) => {
		const createdAt = 1;
		await tx.insert(gyms).values({
			id: 1,
			name: 'Ropewalk Strength',
			placeName: 'Galway',
			zone: specZone,
			currency: 'EUR',
			createdAt
		});
		const one = <T extends { id: number }>(rows: T[]) => rows[0]!.id;
		const room = async (name: string, places: number) =>
			one(await tx.insert(rooms).values({ name, places, createdAt }).returning());
		const person = async (name: string, role: Role) => {
			const email = `${name.toLowerCase()}@ropewalk.example`;
			const id = one(await tx.insert(people).values({ name, email, createdAt }).returning());
			await tx.insert(personRoles).values({ personId: id, role, grantedAt: 1 });
			return id;
		};
		const [roomId, loftId] = [await room('Long Floor', 18), await room('Loft', 10)];
		const coachId = await person('Tomasz', 'coach');
		const deskId = await person('Brid', 'front_desk');
		const classTypeId = one(
			await tx
				.insert(classTypes)
				.values({ name: 'Strength', lengthMin: 60, cutOffMin: 120, createdAt })
				.returning()
		);
		const group = async (name: string, count: number) => {
			const id = one(
				await tx
					.insert(kitGroups)
					.values({ name, plural: `${name}s`, createdAt })
					.returning()
			);
			await tx.insert(kitItems).values({ kitGroupId: id, count, createdAt });
			return id;
		};
		const bars = await group('bar place', barPlaces);
		const ringPairs = await group('pair of rings', rings);
		const movementId = one(
			await tx
				.insert(movements)
				.values({
					name: 'Pull-up',
					pattern: 'vertical pull',
					muscles: ['back'],
					secondsPerRep: 3,
					createdAt,
					updatedAt: createdAt
				})
				.returning()
		);
		const rung = async (name: string, at: number, need?: number) => {
			const id = one(
				await tx.insert(variations).values({ movementId, name, rung: at }).returning()
			);
			if (need) await tx.insert(variationNeeds).values({ variationId: id, kitGroupId: need });
			return id;
		};
		const strictId = await rung('Strict pull-up', 0, bars);
		const ringRowId = await rung('Ring row', 1, ringPairs);
		const floorId = await rung('Prone row', 2);
		const prescriptionId = 'p1';
		const content: SessionContent = {
			title: 'Bar and rings',
			aim: 'Pull',
			blocks: [
				{
					id: 'b1',
					kind: 'strength',
					format: 'straight',
					rotation: 'together',
					waves: 1,
					setUpS: 0,
					prescriptions: [
						{
							id: prescriptionId,
							movementId,
							variationId: strictId,
							sets: 5,
							reps: 5,
							restS: 90,
							perSide: false,
							load: { kind: 'any' }
						}
					]
				}
			]
		};
		const trainingSessionId = one(
			await tx
				.insert(trainingSessions)
				.values({ title: content.title, lengthMin: 60, revisionNumber: 1, createdAt })
				.returning()
		);
		const revisionId = one(
			await tx
				.insert(sessionRevisions)
				.values({ trainingSessionId, number: 1, content, createdAt })
				.returning()
		);
		return {
			roomId,
			loftId,
			coachId,
			deskId,
			classTypeId,
			movementId,
			strictId,
			ringRowId,
			floorId,
			revisionId,
			prescriptionId
		};
	});
}

type SlotPlan = {
	on?: string;
	time?: string;
	lengthMin?: number;
	roomId?: number;
	coachId?: number | null;
	setPlaces?: number | null;
	revisionId?: number | null;
	published?: boolean;
};

let uid = 0;

/** A class of the spec gym; on Wednesday 2 December at 18:40 with the session laid, unless said otherwise. */
export async function addSlot(gym: SpecGym, plan: SlotPlan = {}): Promise<number> {
	const { on = '2026-12-02', time = '18:40', lengthMin = 60, setPlaces = null } = plan;
	const startsAt = instantOf(on, time, specZone);
	const sessionRevisionId = plan.revisionId === undefined ? gym.revisionId : plan.revisionId;
	return write(async (tx) => {
		const [slot] = await tx
			.insert(slots)
			.values({
				uid: `spec-${(uid += 1)}`,
				classTypeId: gym.classTypeId,
				roomId: plan.roomId ?? gym.roomId,
				startsOn: on,
				startTime: time,
				startsAt,
				endsAt: startsAt + lengthMin * 60_000,
				setPlaces,
				sessionRevisionId,
				laidAt: sessionRevisionId === null ? null : 1,
				sessionPublishedAt: sessionRevisionId !== null && plan.published ? 1 : null,
				modifiedAt: 1,
				createdAt: 1
			})
			.returning();
		const coachId = plan.coachId === undefined ? gym.coachId : plan.coachId;
		if (coachId !== null)
			await tx.insert(slotCoaches).values({ slotId: slot!.id, personId: coachId });
		return slot!.id;
	});
}

/** Members with an unlimited membership each, or a pack of so many credits. */
export async function addMembers(count: number, credits?: number): Promise<number[]> {
	return write(async (tx) => {
		const ids: number[] = [];
		for (let i = 0; i < count; i += 1) {
			const [person] = await tx
				.insert(people)
				.values({ name: `Member ${i + 1}`, email: `m${(uid += 1)}@ropewalk.example`, createdAt: 1 })
				.returning();
			ids.push(person!.id);
			await tx.insert(personRoles).values({ personId: person!.id, role: 'member', grantedAt: 1 });
			const kind = credits === undefined ? 'membership' : 'pack';
			const [pass] = await tx
				.insert(passes)
				.values({ personId: person!.id, kind, name: 'Pass', startsOn: '2026-01-01', createdAt: 1 })
				.returning();
			if (credits) await grantCredits(tx, pass!.id, credits, { now: 1, byId: null });
		}
		return ids;
	});
}

/** Somebody who holds these roles, as a command sees them. */
export const acting = (personId: number, ...roles: Role[]) => ({
	personId,
	capabilities: capabilitiesOf(roles.length > 0 ? roles : ['member'])
});
