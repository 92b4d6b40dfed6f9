import { capabilitiesOf } from '../../src/lib/domain/people/capabilities';
import type { SeriesDraft } from '../../src/lib/forms/series';
import { db, write } from '../../src/lib/server/db';
import {
	auditEntries,
	bookingChanges,
	bookings,
	classTypes,
	clashOverrides,
	closures,
	kitGroups,
	kitItems,
	ledgerEntries,
	movements,
	outboxMessages,
	passes,
	people,
	personRoles,
	publications,
	rooms,
	series,
	sessionRevisions,
	slotCoaches,
	slots,
	trainingSessions,
	variationNeeds,
	variations
} from '../../src/lib/server/db/schema';
import type { Viewer } from '../../src/lib/server/guard';
import { addGym } from './people';

process.env.ORIGIN ??= 'http://localhost:4173';
process.env.DATABASE_URL ??= 'file:unused.db';
process.env.AUTH_SECRET ??= 'for tests alone, thirty-two characters';

/** Tuesday 1 December 2026, 10:00 in Dublin (UTC+0 in winter). */
export const now = Date.parse('2026-12-01T10:00:00Z');

export const head: Viewer = {
	personId: 1,
	name: 'Niamh Corrigan',
	email: 'head@ropewalk.example',
	roles: ['head_coach'],
	capabilities: capabilitiesOf(['head_coach']),
	signInId: 'x'
};

/** The named gym of the specs: two rooms, two coaches, four members with passes, one class type, six rowers. */
export async function addTimetable() {
	return write(async (tx) => {
		await addGym(tx);
		const names = [
			'Niamh Corrigan',
			'Tomasz Wrona',
			'Ada Byrne',
			'Ben Cole',
			'Cara Daly',
			'Dan Egan'
		];
		for (const [i, name] of names.entries()) {
			const email = `${name.split(' ')[0]!.toLowerCase()}@ropewalk.example`;
			await tx.insert(people).values({ id: i + 1, name, email, createdAt: 1 });
			const role = i === 0 ? 'head_coach' : i === 1 ? 'coach' : 'member';
			await tx.insert(personRoles).values({ personId: i + 1, role, grantedAt: 1 });
			if (role === 'member') {
				const pass = { personId: i + 1, kind: 'membership' as const, name: 'Monthly' };
				await tx.insert(passes).values({ ...pass, startsOn: '2026-01-01', createdAt: 1 });
			}
		}
		await tx.insert(rooms).values([
			{ id: 1, name: 'Long Floor', places: 18, createdAt: 1 },
			{ id: 2, name: 'Loft', places: 10, createdAt: 1 }
		]);
		await tx
			.insert(classTypes)
			.values({ id: 1, name: 'Strength', lengthMin: 60, cutOffMin: 120, createdAt: 1 });
		await tx.insert(kitGroups).values({ id: 1, name: 'rower', plural: 'rowers', createdAt: 1 });
		await tx.insert(kitItems).values({ id: 1, kitGroupId: 1, count: 2, createdAt: 1 });
		await tx.insert(movements).values({
			id: 1,
			name: 'Row',
			pattern: 'conditioning',
			muscles: [],
			secondsPerRep: 3,
			createdAt: 1,
			updatedAt: 1
		});
		await tx.insert(variations).values([
			{ id: 1, movementId: 1, name: 'On the rower', rung: 0 },
			{ id: 2, movementId: 1, name: 'Shuttle runs', rung: 1 }
		]);
		await tx.insert(variationNeeds).values({ variationId: 1, kitGroupId: 1 });
		return { coachId: 2, memberIds: [3, 4, 5, 6] };
	});
}

/** A session of one block of `minutes`, in which everybody rows, or runs where `variationId` is 2. */
export async function addSession(
	title: string,
	{ minutes = 20, variationId = 1, prescriptionId = 'row' } = {}
): Promise<number> {
	return write(async (tx) => {
		const [made] = await tx
			.insert(trainingSessions)
			.values({ title, lengthMin: 60, revisionNumber: 1, createdAt: 1 })
			.returning({ id: trainingSessions.id });
		await tx.insert(sessionRevisions).values({
			trainingSessionId: made!.id,
			number: 1,
			createdAt: 1,
			content: {
				title,
				aim: '',
				blocks: [
					{
						id: 'b1',
						kind: 'conditioning',
						format: 'for-time',
						rotation: 'together',
						waves: 1,
						setUpS: 0,
						capS: minutes * 60,
						prescriptions: [
							{
								id: prescriptionId,
								movementId: 1,
								variationId,
								metres: 500,
								metresPerSecond: 3,
								perSide: false,
								load: { kind: 'any' }
							}
						]
					}
				]
			}
		});
		return made!.id;
	});
}

/** Mondays and Wednesdays at 18:40 from 7 December 2026 on. */
export const mondaysAndWednesdays: SeriesDraft = {
	classTypeId: 1,
	roomId: 1,
	coachIds: [1],
	startsOn: '2026-12-07',
	startTime: '18:40',
	lengthMin: 60,
	repeats: 'weekly',
	every: 1,
	days: ['MO', 'WE'],
	ends: 'never',
	typedRule: ''
};

export const bookInto = (
	slotId: number,
	personIds: number[],
	status: 'booked' | 'waitlisted' = 'booked'
) =>
	write(async (tx) => {
		for (const personId of personIds) {
			const times = { createdAt: now, updatedAt: now };
			await tx.insert(bookings).values({ slotId, personId, status, ...times });
		}
	});

/** Rows of every table that a command may touch: what a refusal leaves unchanged. */
export async function rowCounts(): Promise<Record<string, number>> {
	const tables = {
		auditEntries,
		bookingChanges,
		bookings,
		clashOverrides,
		classTypes,
		closures,
		ledgerEntries,
		outboxMessages,
		publications,
		rooms,
		series,
		slotCoaches,
		slots
	};
	const counts: Record<string, number> = {};
	for (const [name, table] of Object.entries(tables)) counts[name] = await db.$count(table);
	return counts;
}
