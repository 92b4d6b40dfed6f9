import { eq } from 'drizzle-orm';
import { weekOf } from '$lib/domain/calendar/civil-date';
import { placesOf } from '../../slots/places';
import { limitsOfSlots } from '../../slots/limits';
import type { Tx } from '..';
import {
	bookingChanges,
	bookings,
	ledgerEntries,
	ledgerTransfers,
	type BookingStatus
} from '../schema';
import type { SeedMember } from './people';
import type { Random } from './random';
import type { SeedSlot } from './timetable';

type Plan = { now: number; random: Random; deskId: number };
type Row = typeof bookings.$inferInsert;
type Use = { passId: number; row: number; at: number; back: boolean };

const hourMs = 3_600_000;
const batch = 250;

/** Members' weeks so far, so that nobody is in two classes at once or past their membership. */
class Diary {
	#spans = new Map<number, { from: number; to: number }[]>();
	#weeks = new Map<string, number>();

	isFree(member: SeedMember, slot: SeedSlot): boolean {
		const clash = this.#spans
			.get(member.id)
			?.some((s) => s.from < slot.endsAt && s.to > slot.startsAt);
		return !clash;
	}
	covers({ pass }: SeedMember, slot: SeedSlot): boolean {
		if (
			!pass ||
			pass.startsOn > slot.startsOn ||
			(pass.endsOn !== null && pass.endsOn < slot.startsOn)
		)
			return false;
		if (pass.kind === 'pack') return pass.left > 0;
		return (
			pass.perWeek === null ||
			(this.#weeks.get(`${pass.id} ${weekOf(slot.startsOn)}`) ?? 0) < pass.perWeek
		);
	}
	note(member: SeedMember, slot: SeedSlot, pays: boolean): void {
		const spans = this.#spans.get(member.id) ?? [];
		spans.push({ from: slot.startsAt, to: slot.endsAt });
		this.#spans.set(member.id, spans);
		if (!pays || !member.pass) return;
		if (member.pass.kind === 'pack') member.pass.left -= 1;
		const key = `${member.pass.id} ${weekOf(slot.startsOn)}`;
		this.#weeks.set(key, (this.#weeks.get(key) ?? 0) + 1);
	}
}

/**
 * Six weeks of classes that ran and five of classes to come. Classes fill by their hour; none takes
 * more than its places beside the others, counted by the same rules as a booking.
 */
export async function addBookings(
	tx: Tx,
	all: SeedSlot[],
	members: SeedMember[],
	plan: Plan
): Promise<void> {
	const { now } = plan;
	const diary = new Diary();
	const writer = new BookingWriter(tx, plan);
	for (const slot of all.filter(({ endsAt }) => endsAt <= now)) {
		await past(slot, members, diary, writer, plan);
	}
	await writer.flush();
	const coming = all.filter(({ endsAt, week }) => endsAt > now && week <= 4);
	await forTheDemoMember(coming, members[0]!, diary, writer);
	await writer.flush();
	for (const slot of coming) {
		await future(tx, slot, members, diary, writer, plan);
		await writer.flush();
	}
}

async function past(
	slot: SeedSlot,
	members: SeedMember[],
	diary: Diary,
	writer: BookingWriter,
	{ random, now }: Plan
) {
	const most =
		slot.type === 'basics' || slot.type === 'floor' || slot.type === 'intervals' ? 9 : 16;
	const count = Math.round(most * popularity(slot) * (0.55 + 0.45 * random.next()));
	let added = 0;
	for (const member of random.shuffled(members)) {
		if (added >= count) break;
		if (!diary.isFree(member, slot) || !diary.covers(member, slot)) continue;
		if (member === members[0] && member.pass!.left <= 10) continue;
		const fate = random.next();
		const status: BookingStatus =
			fate < 0.86
				? 'attended'
				: fate < 0.91
					? 'no-show'
					: fate < 0.96
						? 'cancelled'
						: 'late-cancelled';
		diary.note(member, slot, status !== 'cancelled');
		const isLate = status === 'attended' && random.next() < 0.05;
		const at = Math.min(now, slot.startsAt - (6 + random.below(120)) * hourMs);
		await writer.add(slot, member, status, at, isLate);
		if (status !== 'cancelled' && status !== 'late-cancelled') added += 1;
	}
}

async function future(
	tx: Tx,
	slot: SeedSlot,
	members: SeedMember[],
	diary: Diary,
	writer: BookingWriter,
	{ random, now }: Plan
) {
	const limits = await limitsOfSlots([slot.id], tx);
	const limit = (await placesOf(limits, slot.startsAt, slot.endsAt, tx)).get(slot.id)?.limit ?? 0;
	const there = await tx.select().from(bookings).where(eq(bookings.slotId, slot.id));
	const eager = popularity(slot) * [1, 0.85, 0.45, 0.25, 0.15][Math.max(0, slot.week)]!;
	const wanted = Math.round(limit * eager * (0.7 + 0.6 * random.next()));
	let taken = there.filter(({ status }) => status === 'booked').length;
	let waiting = 0;
	const already = new Set(there.map(({ personId }) => personId));
	for (const member of random.shuffled(members.slice(1))) {
		if (taken + waiting >= Math.min(wanted, limit + 4)) break;
		if (already.has(member.id) || !diary.isFree(member, slot) || !diary.covers(member, slot))
			continue;
		const isIn = taken < limit;
		diary.note(member, slot, isIn);
		await writer.add(
			slot,
			member,
			isIn ? 'booked' : 'waitlisted',
			now - (1 + random.below(96)) * hourMs
		);
		if (isIn) taken += 1;
		else waiting += 1;
	}
}

/** Something to see on the first sign-in: a place in the next evening class and another in the week's end. */
async function forTheDemoMember(
	coming: SeedSlot[],
	member: SeedMember,
	diary: Diary,
	writer: BookingWriter
) {
	const strength = coming.filter(({ type, startsAt }) => type === 'strength' && startsAt > 0);
	for (const index of [1, 6, 13]) {
		const slot = strength[index];
		if (!slot || !diary.isFree(member, slot) || !diary.covers(member, slot)) continue;
		diary.note(member, slot, true);
		await writer.add(slot, member, 'booked', slot.startsAt - 90 * hourMs);
	}
}

/** Early mornings and evenings fill up; Friday and the lunch hour do not. */
function popularity({ startsAt, type, startsOn }: SeedSlot): number {
	const hour = new Date(startsAt).getUTCHours();
	const byHour = hour < 8 ? 0.95 : hour < 12 ? 0.7 : hour < 15 ? 0.6 : 1.05;
	const friday = new Date(`${startsOn}T12:00:00Z`).getUTCDay() === 5 ? 0.8 : 1;
	return byHour * friday * (type === 'basics' ? 0.8 : 1);
}

/** Writes bookings with their changes and credits, many at a time. */
class BookingWriter {
	#rows: Row[] = [];
	#uses: Use[] = [];
	constructor(
		private tx: Tx,
		private plan: Plan
	) {}

	async add(
		slot: SeedSlot,
		member: SeedMember,
		status: BookingStatus,
		at: number,
		isLate = false
	): Promise<void> {
		const createdAt = Math.min(at, this.plan.now);
		const isIn = status !== 'waitlisted';
		const passId = isIn ? (member.pass?.id ?? null) : null;
		if (isIn && member.pass?.kind === 'pack') {
			this.#uses.push({
				passId: member.pass.id,
				row: this.#rows.length,
				at: createdAt,
				back: status === 'cancelled'
			});
		}
		this.#rows.push({
			slotId: slot.id,
			personId: member.id,
			status,
			passId,
			isLate,
			checkedInAt: status === 'attended' ? slot.startsAt - (isLate ? -4 : 6) * 60_000 : null,
			createdAt,
			createdById: member.id,
			updatedAt:
				status === 'booked' || status === 'waitlisted'
					? createdAt
					: Math.min(this.plan.now, slot.startsAt)
		});
		if (this.#rows.length >= batch) await this.flush();
	}

	async flush(): Promise<void> {
		const rows = this.#rows;
		if (rows.length === 0) return;
		const ids = await this.tx.insert(bookings).values(rows).returning({ id: bookings.id });
		const changes = rows.flatMap((row, i) => {
			const bookingId = ids[i]!.id;
			const entered = row.status === 'waitlisted' ? ('waitlisted' as const) : ('booked' as const);
			const first = {
				bookingId,
				fromStatus: null,
				toStatus: entered,
				at: row.createdAt,
				byId: row.personId
			};
			if (row.status === entered) return [first];
			const byId =
				row.status === 'attended' || row.status === 'no-show' ? this.plan.deskId : row.personId;
			return [
				first,
				{ bookingId, fromStatus: entered, toStatus: row.status, at: row.updatedAt, byId }
			];
		});
		await this.tx.insert(bookingChanges).values(changes);
		for (const use of this.#uses) await this.#pay(use, ids[use.row]!.id);
		this.#rows = [];
		this.#uses = [];
		await new Promise(setImmediate);
	}

	async #pay({ passId, at, back }: Use, bookingId: number): Promise<void> {
		const use = await this.#move('use', `pass:${passId}`, 'used', at, bookingId, null);
		if (back) await this.#move('give-back', 'used', `pass:${passId}`, at, bookingId, use);
	}

	async #move(
		kind: 'use' | 'give-back',
		from: string,
		to: string,
		at: number,
		bookingId: number,
		reversesId: number | null
	) {
		const [row] = await this.tx
			.insert(ledgerTransfers)
			.values({ kind, at, bookingId, reversesId })
			.returning({ id: ledgerTransfers.id });
		const unit = 'credit';
		await this.tx.insert(ledgerEntries).values([
			{ transferId: row!.id, account: to, unit, amount: 1 },
			{ transferId: row!.id, account: from, unit, amount: -1 }
		]);
		return row!.id;
	}
}
