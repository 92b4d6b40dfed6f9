import { and, eq, inArray, isNull, lte, or, gte, sql } from 'drizzle-orm';
import { coveringPass } from '$lib/domain/booking';
import { addDays, weekOf } from '$lib/domain/calendar/civil-date';
import { db, type Queryable } from '../db';
import { prepared } from '../db/prepared';
import { bookings, passes, slots } from '../db/schema';

/** A pass with what is left of it for a class on a day: a pack's credits, a membership's week. */
export type PassState = {
	id: number;
	kind: 'membership' | 'pack';
	name: string;
	perWeek: number | null;
	startsOn: string;
	endsOn: string | null;
	endedAt: number | null;
	balance: number;
	usedThisWeek: number;
};

/** A pack's credits: the sum of its account in the ledger. For selects from `passes`. */
export const balanceOf = sql<number>`coalesce((
	select sum(l.amount) from ledger_entries l where l.account = 'pass:' || passes.id and l.unit = 'credit'
), 0)`;

const passesOn = prepared<{ personId: number; on: string }>()((q, at) =>
	q
		.select({
			id: passes.id,
			kind: passes.kind,
			name: passes.name,
			perWeek: passes.perWeek,
			startsOn: passes.startsOn,
			endsOn: passes.endsOn,
			endedAt: passes.endedAt,
			balance: balanceOf
		})
		.from(passes)
		.where(
			and(
				eq(passes.personId, at('personId')),
				isNull(passes.endedAt),
				lte(passes.startsOn, at('on')),
				or(isNull(passes.endsOn), gte(passes.endsOn, at('on')))
			)
		)
);

/** The pass that pays for a person's class on the civil date `on`, by the rules of `coveringPass`. */
export async function passCovering(
	personId: number,
	on: string,
	weekStartsOn: number,
	q: Queryable = db
): Promise<PassState | null> {
	const states = await passStates(personId, on, weekStartsOn, q);
	const id = coveringPass(states, on);
	return states.find((state) => state.id === id) ?? null;
}

/** A person's passes that are in date on `on`, with their credits and how often they pay in its week. */
export async function passStates(
	personId: number,
	on: string,
	weekStartsOn: number,
	q: Queryable = db
): Promise<PassState[]> {
	const inDate = await passesOn(q, { personId, on });
	const counted = inDate.filter(({ perWeek }) => perWeek !== null).map(({ id }) => id);
	const used = counted.length > 0 ? await usedInWeek(counted, weekOf(on, weekStartsOn), q) : [];
	return inDate.map((pass) => ({
		...pass,
		usedThisWeek: used.find(({ passId }) => passId === pass.id)?.n ?? 0
	}));
}

/** Statuses that use a class of the week: a late cancellation and an absence are spent. */
const spent = ['held', 'booked', 'attended', 'no-show', 'late-cancelled'] as const;

function usedInWeek(passIds: number[], weekOn: string, q: Queryable) {
	return q
		.select({ passId: bookings.passId, n: sql<number>`count(*)` })
		.from(bookings)
		.innerJoin(slots, eq(slots.id, bookings.slotId))
		.where(
			and(
				inArray(bookings.passId, passIds),
				inArray(bookings.status, [...spent]),
				gte(slots.startsOn, weekOn),
				lte(slots.startsOn, addDays(weekOn, 6))
			)
		)
		.groupBy(bookings.passId);
}
