import ical, { ICalEventStatus } from 'ical-generator';
import * as m from '$lib/wording/compiled/messages';
import type { FeedEntry } from './queries';

export type CalendarFacts = { name: string; origin: string; host: string };

/**
 * Writes a feed as RFC 5545 text. Instants are UTC, so no time zone needs defining; UID, SEQUENCE,
 * DTSTAMP and STATUS come from the stored slot, so that two readings of an unchanged feed are equal.
 */
export function writeCalendar(entries: FeedEntry[], { name, origin, host }: CalendarFacts): string {
	const calendar = ical({
		name: plain(name),
		prodId: { company: 'Kithour', product: 'classes', language: 'EN' },
		ttl: 3600
	});
	for (const entry of entries) {
		const stamp = new Date(entry.modifiedAt);
		calendar.createEvent({
			id: `${entry.uid}@${host}`,
			start: new Date(entry.startsAt),
			end: new Date(entry.endsAt),
			stamp,
			created: new Date(entry.createdAt),
			lastModified: stamp,
			sequence: entry.sequence,
			summary: plain(entry.title),
			location: plain(entry.room),
			description: entry.coaches ? m.feeds_with({ coaches: plain(entry.coaches) }) : null,
			url: `${origin}/classes/${entry.id}`,
			status: entry.cancelledAt === null ? ICalEventStatus.CONFIRMED : ICalEventStatus.CANCELLED
		});
	}
	return calendar.toString();
}

/** Control characters, and the two line separators that Unicode has besides. */
const controls = /[\p{Cc}\u2028\u2029]+/gu;

/** The library writes a calendar's name as it stands: no control character may reach it. */
const plain = (text: string) => text.replace(controls, ' ').trim();
