import type { BookingDraft, Records } from './records';
import { Diary, isPack, likeliest, popularity, timesOf } from './diary';
import { bookingNotes } from './people-data';
import type { SeedMember, SeedPass, Staff } from './people';
import type { Random } from './random';
import type { SeedSlot } from './timetable';

export type Plan = {
	now: number;
	random: Random;
	staffIds: Staff;
	records: Records;
	diary: Diary;
	/** Most people in a slot by its room, its coach and by hand. */
	most: (slot: SeedSlot) => number;
};

const minuteMs = 60_000;
const hourMs = 60 * minuteMs;

/** One class that has ended: who came, who did not, who cancelled in time or late, and its roll. */
export function addPast(slot: SeedSlot, members: SeedMember[], plan: Plan): void {
	const { random, diary, records } = plan;
	const most = plan.most(slot);
	const share = popularity(slot) * (0.65 + 0.55 * random.next());
	const wanted = Math.min(most, Math.round(most * share));
	let there = 0;
	let noShows = 0;
	for (const member of likeliest(members, slot, random)) {
		if (there >= wanted) break;
		if (slot.cancelledAt !== null && member === members[0]) continue;
		const pass = payerOf(member, slot, diary);
		if (!pass && !isTrial(member, slot, plan)) continue;
		const at = bookedAt(slot, member, pass, plan);
		if (at === null) continue;
		const fate =
			slot.cancelledAt === null
				? member === members[0]
					? 'attended'
					: fateOf(random.next(), member)
				: 'released';
		diary.note(member, slot, pass);
		const draft = draftOf(slot, member, pass, at, plan);
		const status = apply(draft, fate, slot, plan);
		records.book(draft);
		if (!status.endsWith('cancelled')) there += 1;
		if (status === 'no-show') noShows += 1;
	}
	if (slot.cancelledAt !== null) auditCallOff(slot, there, records);
	else {
		const fact = { verb: 'roll.close', noun: 'slots', nounId: slot.id, detail: { noShows } };
		records.audit({ ...fact, at: closedAt(slot), byId: slot.coachId });
	}
}

/** Says in the audit log that a class was called off, and how many it let go. */
export function auditCallOff(slot: SeedSlot, released: number, records: Records): void {
	const fact = { verb: 'slots.call-off', noun: 'slots', nounId: slot.id };
	const detail = { why: slot.cancelReason, released };
	records.audit({ ...fact, at: slot.cancelledAt!, byId: slot.cancelledById, detail });
}

/** The pass that pays for a member who has time and the wish to come; null where there is none. */
export function payerOf(
	member: SeedMember,
	slot: SeedSlot,
	diary: Diary,
	atMost = member.keen
): SeedPass | null {
	if (!diary.isFree(member, slot) || diary.timesIn(member, slot) >= atMost) return null;
	if (atMost < Infinity && !member.days.includes(slot.day)) return null;
	return diary.passFor(member, slot);
}

/** Somebody without a pass comes once, and the desk lets them. */
function isTrial(member: SeedMember, slot: SeedSlot, { diary, random }: Plan): boolean {
	const could = member.passes.length === 0 && diary.isFree(member, slot);
	return could && member.joinedAt < slot.startsAt && random.next() < 0.04;
}

/** When somebody booked: mostly in the last days, never before it opened or they could pay. */
export function bookedAt(
	slot: SeedSlot,
	member: SeedMember,
	pass: SeedPass | null,
	{ random, now }: Pick<Plan, 'random' | 'now'>
): number | null {
	const { opensAt } = timesOf(slot);
	const earliest = Math.max(opensAt, member.joinedAt, pass?.createdAt ?? 0) + 5 * minuteMs;
	const latest = Math.min(
		now - 5 * minuteMs,
		slot.startsAt - 40 * minuteMs,
		slot.cancelledAt ?? now
	);
	if (earliest >= latest) return null;
	const before = Math.round(random.next() ** 2 * 160 * hourMs);
	const at = latest - before;
	const isNight = new Date(at).getUTCHours() < 6;
	return Math.max(earliest, isNight ? Math.min(latest, at + 7 * hourMs) : at);
}

export function draftOf(
	slot: SeedSlot,
	member: SeedMember,
	pass: SeedPass | null,
	at: number,
	{ random, staffIds, records }: Pick<Plan, 'random' | 'staffIds' | 'records'>
): BookingDraft {
	const byDesk = pass === null;
	const byId = byDesk ? staffIds.desk : member.id;
	const draft: BookingDraft = {
		row: {
			slotId: slot.id,
			personId: member.id,
			passId: pass?.id ?? null,
			complimentaryById: byDesk ? staffIds.desk : null,
			complimentaryWhy: byDesk ? 'First class, on the house' : null,
			note: random.next() < 0.03 ? random.pick(bookingNotes) : null
		},
		changes: [{ to: 'booked', at, byId }],
		...(pass && isPack(pass) ? { credit: { passId: pass.id, at } } : {})
	};
	if (byDesk) {
		const detail = { slotId: slot.id, personId: member.id, status: 'booked' };
		const fact = { verb: 'bookings.book', noun: 'bookings', booking: draft };
		records.audit({
			...fact,
			at,
			byId,
			detail: { ...detail, complimentary: 'First class, on the house' }
		});
	}
	return draft;
}

type Fate = 'attended' | 'no-show' | 'cancelled' | 'released';

/** The more they come, the less they stay away. */
function fateOf(share: number, { keen, level }: SeedMember): Fate {
	const stays = 0.84 + 0.02 * keen + 0.06 * level;
	if (share < stays) return 'attended';
	return share < stays + (1 - stays) / 3 ? 'no-show' : 'cancelled';
}

/** What became of a booking of a class that has ended; a cancellation is late after the cut-off. */
function apply(draft: BookingDraft, fate: Fate, slot: SeedSlot, plan: Plan): string {
	const { random, staffIds } = plan;
	const [{ at: madeAt }] = draft.changes;
	if (fate === 'released') {
		const at = slot.cancelledAt!;
		draft.changes.push({ to: 'released', at, byId: slot.cancelledById, why: slot.cancelReason! });
		if (draft.credit) draft.credit.backAt = at;
		return fate;
	}
	if (fate === 'cancelled') {
		const at = Math.round(madeAt + (slot.startsAt - 10 * minuteMs - madeAt) * random.next());
		return cancelAt(draft, slot, at);
	}
	if (fate === 'no-show') {
		draft.changes.push({ to: 'no-show', at: closedAt(slot), byId: slot.coachId });
		return fate;
	}
	if (random.next() < 0.04) makePromoted(draft, slot, random);
	const isLate = random.next() < 0.06;
	const minutes = isLate ? 2 + random.below(7) : -1 - random.below(14);
	const at = slot.startsAt + minutes * minuteMs;
	const isWalkIn = draft.changes.length === 1 && random.next() < 0.025;
	if (isWalkIn) makeWalkIn(draft, at, plan);
	comeIn(draft, slot, at, isLate, staffIds, plan.records);
	return fate;
}

/** Waited first, and got the place of somebody who cancelled in time. */
function makePromoted(draft: BookingDraft, slot: SeedSlot, random: Random): void {
	const [{ at, byId }] = draft.changes;
	const left = timesOf(slot).cutOffAt - at;
	if (left < hourMs || draft.row.passId === null) return;
	const placeAt = at + Math.round(left * (0.2 + 0.7 * random.next()));
	draft.changes = [
		{ to: 'waitlisted', at, byId },
		{ to: 'booked', at: placeAt, byId: null, why: 'promoted' }
	];
	if (draft.credit) draft.credit.at = placeAt;
}

/** Came without a booking, and the desk let them in. */
function makeWalkIn(draft: BookingDraft, at: number, { staffIds, records }: Plan): void {
	if (draft.row.passId === null) return;
	draft.row.isWalkIn = true;
	draft.changes = [{ to: 'booked', at, byId: staffIds.desk }];
	if (draft.credit) draft.credit.at = at;
	const detail = { slotId: draft.row.slotId, personId: draft.row.personId };
	const fact = { verb: 'bookings.walk-in', noun: 'bookings', booking: draft };
	records.audit({ ...fact, at, byId: staffIds.desk, detail });
}

export function cancelAt(draft: BookingDraft, slot: SeedSlot, at: number): string {
	const to = at <= timesOf(slot).cutOffAt ? 'cancelled' : 'late-cancelled';
	draft.changes.push({ to, at, byId: draft.row.personId });
	if (to === 'cancelled' && draft.credit) draft.credit.backAt = at;
	return to;
}

/** A mark on the roll, by the desk, or before it opens by the coach. */
export function comeIn(
	draft: BookingDraft,
	slot: SeedSlot,
	at: number,
	isLate: boolean,
	staffIds: Staff,
	records: Records
): void {
	const byId = slot.startTime < '09:00' ? slot.coachId : staffIds.desk;
	draft.row.isLate = isLate;
	draft.row.checkedInAt = at;
	draft.changes.push({ to: 'attended', at, byId });
	const detail = { slotId: slot.id, from: 'booked', to: 'attended', late: isLate };
	records.audit({ at, byId, verb: 'roll.mark', noun: 'bookings', booking: draft, detail });
}

const closedAt = ({ endsAt }: SeedSlot) => endsAt - 5 * minuteMs;
