import { eq, sql } from 'drizzle-orm';
import { refuse, type Refused } from '$lib/domain/refusal';
import type { LayDraft } from '$lib/forms/lay';
import { audit } from '../audit/record';
import { db, write, type Queryable, type Tx } from '../db';
import { bookings, slots, type LoadChoices } from '../db/schema';
import type { Viewer } from '../guard';
import { currentGym } from '../gym/queries';
import { affectedBy, type AffectedSlot } from './affected';
import { refusedForKit, type Revised } from './kit-check';
import { lookFirst, type LookFirst } from './look';
import { planLaying, type Laying, type LayingRefusal, type LayingRow } from './plan-laying';
import { planSlotsBetween } from './plan-slots';
import { promoteWaiting } from './promote-waiting';
import { tellPeople } from './tell';

/**
 * Lays a session's current revision on slots, or takes off what is laid. Choices that still exist
 * stay; the rest fall to as written, and those people are told. Where a slot's session was
 * published, the new one shows at once. Refused where people who hold a place would lose kit.
 */
export async function lay(
	viewer: Viewer,
	draft: LayDraft,
	{ now }: { now: number }
): Promise<
	| { ok: true; slots: number; told: number }
	| LayingRefusal
	| Refused<'no-gym' | 'kit-short'>
	| LookFirst
> {
	return write(async (tx) => {
		const gym = await currentGym(tx);
		if (!gym) return refuse('no-gym');
		const looked = await lookAtLaying(draft, { now }, tx);
		if (!looked.ok) return looked;
		const { laying, short, affected } = looked;
		if (short) return short;
		const look = lookFirst(affected, [], draft, laying.session?.revisionId ?? null);
		if (look) return look;

		for (const row of laying.rows) {
			await layOn(tx, row, laying, now);
			await keepWhatExists(tx, row, now);
		}
		const slotIds = laying.rows.map(({ slot }) => slot.id);
		await promoteWaiting(tx, slotIds, { viewer, now });
		const fact = `laid:${now}:${laying.session?.revisionId ?? 'nothing'}`;
		const told = await tellPeople(tx, affected, { gym, why: null, fact, now });
		await audit(tx, {
			viewer,
			verb: laying.session ? 'slots.lay' : 'slots.take-off',
			noun: 'slots',
			nounId: slotIds.length === 1 ? slotIds[0] : undefined,
			now,
			detail: {
				slotIds,
				revisionId: laying.session?.revisionId ?? null,
				told
			}
		});
		return { ok: true, slots: laying.rows.length, told };
	});
}

/** What laying does, before it is done: the plan, kit that people would lose, and who is told. */
export async function lookAtLaying(
	draft: LayDraft,
	{ now }: { now: number },
	q: Queryable = db
): Promise<
	| {
			ok: true;
			laying: Laying;
			short: Refused<'kit-short'> | null;
			affected: AffectedSlot[];
			seen: string | null;
	  }
	| LayingRefusal
> {
	const planned = await planLaying(draft, { now }, q);
	if (!planned.ok) return planned;
	const { laying } = planned;
	const short = await shortOnceLaid(q, laying);
	const affected = await losers(q, laying);
	const look = lookFirst(affected, [], {}, laying.session?.revisionId ?? null);
	return { ok: true, laying, short, affected, seen: look?.sight.seen ?? null };
}

async function shortOnceLaid(q: Queryable, { rows, content }: Laying) {
	const fromAt = Math.min(...rows.map(({ slot }) => slot.startsAt));
	const toAt = Math.max(...rows.map(({ slot }) => slot.endsAt));
	const standing = await planSlotsBetween(fromAt, toAt, q);
	const revised = new Map<number, Revised>(
		rows.map(({ slot, loses }) => {
			const keptBy = new Map(loses.map(({ bookingId, kept }) => [bookingId, kept]));
			const people = (standing.find(({ id }) => id === slot.id)?.people ?? []).map((person) => ({
				...person,
				choices: keptBy.get(person.bookingId) ?? person.choices
			}));
			return [slot.id, { content, people }];
		})
	);
	return refusedForKit(revised, { fromAt, toAt }, q);
}

/** The slots where somebody loses a choice, with those people alone. */
async function losers(q: Queryable, { rows }: Laying): Promise<AffectedSlot[]> {
	const changes = rows.flatMap(({ slot, loses }) =>
		loses.length === 0
			? []
			: [
					{
						slotId: slot.id,
						becomes: { what: 'laid' as const, loses: loses.map(({ bookingId }) => bookingId) }
					}
				]
	);
	const losing = new Set(changes.flatMap(({ becomes }) => becomes.loses));
	return (await affectedBy(changes, q)).map((slot) => ({
		...slot,
		people: slot.people.filter(({ bookingId }) => losing.has(bookingId))
	}));
}

async function layOn(tx: Tx, { slot }: LayingRow, { session }: Laying, now: number) {
	const isShown = slot.sessionPublishedAt !== null;
	await tx
		.update(slots)
		.set({
			sessionRevisionId: session?.revisionId ?? null,
			laidAt: session ? now : null,
			sessionPublishedAt: session && isShown ? now : null,
			modifiedAt: now,
			...(isShown ? { sequence: sql`${slots.sequence} + 1` } : {})
		})
		.where(eq(slots.id, slot.id));
}

async function keepWhatExists(tx: Tx, { loses }: LayingRow, now: number) {
	for (const { bookingId, kept } of loses) {
		const { variations = {}, loads = {} } = kept;
		await tx
			.update(bookings)
			.set({ variations: { ...variations }, loads: asRanges(loads), updatedAt: now })
			.where(eq(bookings.id, bookingId));
	}
}

const asRanges = (
	loads: Readonly<Record<string, number | readonly [number, number]>>
): LoadChoices =>
	Object.fromEntries(
		Object.entries(loads).map(([id, load]) => [
			id,
			typeof load === 'number' ? [load, load] : [load[0], load[1]]
		])
	);
