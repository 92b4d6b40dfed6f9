import { daysBetween } from './days-between';
import { chooseFor, type Chosen } from './choices';
import { busyOnes, forDemoMember } from './coming-plan';
import { inDayOrder, likeliest, popularity } from './diary';
import type { KitDesk } from './kit-desk';
import type { GroupKey } from './kit-data';
import type { Library } from '../../kit/library';
import { auditCallOff, bookedAt, cancelAt, comeIn, draftOf, payerOf, type Plan } from './past';
import type { SeedMember, SeedPass } from './people';
import type { BookingDraft } from './records';
import type { SeedSlot } from './timetable';

export type ComingPlan = Plan & {
	todayOn: string;
	desk: KitDesk;
	lib: Library;
	groupIds: Record<GroupKey, number>;
};
type Entry = { slot: SeedSlot; member: SeedMember; draft: BookingDraft };

const minuteMs = 60_000;
const noChoices: Chosen = { variations: {}, loads: {} };

/**
 * The classes to come, the running ones with them: a few full with people waiting, the near ones
 * busy, the far ones quiet. Nobody is booked whom room, coach or kit does not serve.
 */
export async function addComing(
	coming: readonly SeedSlot[],
	members: SeedMember[],
	plan: ComingPlan
): Promise<void> {
	const entries: Entry[] = [];
	const open = coming.filter(({ cancelledAt }) => cancelledAt === null);
	const { books, waits, cancels } = forDemoMember(open, plan.now);
	const { full, nearly } = busyOnes(open, [...books, waits], plan.now);
	const demo = members[0]!;
	for (const slot of books) enter(slot, demo, plan, entries);
	plan.diary.reserve(demo, waits);
	if (cancels) addCancelled(cancels, demo, plan);

	const others = members.slice(1);
	for (const slot of open.filter(({ id }) => full.has(id))) {
		const most = plan.most(slot);
		if (fill(slot, others, most, plan, entries, true) < most) continue;
		const waiting = others.filter((m) => payerOf(m, slot, plan.diary, Infinity)).slice(0, 8);
		const line = plan.random.shuffled(waiting).slice(0, 1 + plan.random.below(3));
		if (slot === waits) line.splice(1, 0, demo);
		wait(slot, line, plan, entries);
		await new Promise(setImmediate);
	}
	for (const slot of open.filter(({ id }) => nearly.has(id) && !full.has(id))) {
		const left = 1 + plan.random.below(2);
		fill(slot, others, plan.most(slot) - left, plan, entries, true);
	}
	for (const slot of inDayOrder(open, plan.random)) {
		if (full.has(slot.id)) continue;
		if (nearly.has(slot.id)) continue;
		fill(slot, others, wantedIn(slot, plan), plan, entries);
		await new Promise(setImmediate);
	}
	for (const slot of coming.filter(({ cancelledAt }) => cancelledAt !== null)) {
		releaseAll(slot, others, plan);
	}
	for (const { slot, draft } of entries) {
		checkIn(slot, draft, plan);
		plan.records.book(draft);
	}
}

/** How many have booked by now: nearly all of a near class, few of a far one. */
function wantedIn(slot: SeedSlot, { most, random, todayOn }: ComingPlan): number {
	const days = daysBetween(todayOn, slot.startsOn);
	const byNow = days <= 1 ? 0.95 : days <= 3 ? 0.8 : days <= 7 ? 0.55 : days <= 14 ? 0.3 : 0.12;
	return Math.round(most(slot) * popularity(slot) * byNow * (0.7 + 0.5 * random.next()));
}

function fill(
	slot: SeedSlot,
	members: SeedMember[],
	wanted: number,
	plan: ComingPlan,
	entries: Entry[],
	isBusy = false
): number {
	const target = Math.min(wanted, plan.most(slot));
	let there = entries.filter((entry) => entry.slot === slot).length;
	for (const member of likeliest(members, slot, plan.random, isBusy)) {
		if (there >= target) break;
		const habit = isBusy ? Infinity : member.keen;
		if (!payerOf(member, slot, plan.diary, habit)) continue;
		if (plan.random.next() < 0.03) addCancelled(slot, member, plan);
		else if (enter(slot, member, plan, entries)) there += 1;
	}
	return there;
}

function enter(slot: SeedSlot, member: SeedMember, plan: ComingPlan, entries: Entry[]): boolean {
	const { diary, desk, random } = plan;
	const pass = diary.passFor(member, slot);
	const at = pass && bookedAt(slot, member, pass, plan);
	if (!pass || at === null) return false;
	const content = slot.isPublished ? desk.contentOf(slot.id) : null;
	const wished = content ? chooseFor(member, content, plan.lib, plan.groupIds, random) : noChoices;
	const chosen =
		desk.serve(slot.id, member.id, wished) || desk.serve(slot.id, member.id, noChoices);
	if (!chosen) return false;
	diary.note(member, slot, pass);
	const draft = draftOf(slot, member, pass, at, plan);
	Object.assign(draft.row, chosen);
	entries.push({ slot, member, draft });
	return true;
}

/** Those who came when every place was taken, in their order; nothing is paid yet. */
function wait(slot: SeedSlot, line: SeedMember[], plan: ComingPlan, entries: Entry[]): void {
	const there = entries.filter((entry) => entry.slot === slot);
	let at = Math.max(...there.map(({ draft }) => draft.changes[0].at));
	for (const [i, member] of line.entries()) {
		at += Math.floor(((plan.now - minuteMs - at) / (line.length - i + 1)) * plan.random.next());
		plan.diary.note(member, slot, null);
		const row = { slotId: slot.id, personId: member.id };
		const draft: BookingDraft = { row, changes: [{ to: 'waitlisted', at, byId: member.id }] };
		entries.push({ slot, member, draft });
	}
}

function addCancelled(slot: SeedSlot, member: SeedMember, plan: ComingPlan): void {
	const made = newDraft(slot, member, plan);
	if (!made) return;
	const [{ at }] = made.draft.changes;
	cancelAt(made.draft, slot, at + Math.floor((plan.now - at) * plan.random.next()));
	plan.diary.note(member, slot, made.pass);
	plan.records.book(made.draft);
}

function newDraft(
	slot: SeedSlot,
	member: SeedMember,
	plan: ComingPlan
): { draft: BookingDraft; pass: SeedPass } | null {
	const pass = plan.diary.passFor(member, slot);
	const at = pass && bookedAt(slot, member, pass, plan);
	return pass && at !== null ? { draft: draftOf(slot, member, pass, at, plan), pass } : null;
}

/** A class that was called off let go of the few who had booked. */
function releaseAll(slot: SeedSlot, members: SeedMember[], plan: ComingPlan): void {
	let released = 0;
	for (const member of likeliest(members, slot, plan.random, true)) {
		if (released >= 3) break;
		const made = payerOf(member, slot, plan.diary) && newDraft(slot, member, plan);
		if (!made) continue;
		const at = slot.cancelledAt!;
		const why = slot.cancelReason!;
		made.draft.changes.push({ to: 'released', at, byId: slot.cancelledById, why });
		if (made.draft.credit) made.draft.credit.backAt = at;
		plan.diary.note(member, slot, made.pass);
		plan.records.book(made.draft);
		released += 1;
	}
	auditCallOff(slot, released, plan.records);
}

/** The roll of a class that runs, or starts within minutes, is being taken. */
function checkIn(slot: SeedSlot, draft: BookingDraft, plan: ComingPlan): void {
	const { now, random, staffIds, records } = plan;
	if (draft.changes[0].to !== 'booked' || slot.startsAt - 15 * minuteMs > now) return;
	const at = slot.startsAt - (1 + random.below(14)) * minuteMs;
	if (at > now || random.next() > 0.85) return;
	comeIn(draft, slot, at, false, staffIds, records);
}
