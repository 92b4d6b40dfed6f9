import type { WeekDay } from '../slots/week';

export type WeekSummary = {
	/** Laid, and not shown to members yet. */
	toPublish: number;
	published: number;
	notLaid: number;
};

/** How far a week has come, of the slots that stand. */
export function weekSummary(days: readonly WeekDay[]): WeekSummary {
	const standing = days.flatMap(({ slots }) => slots).filter((slot) => slot.cancelledAt === null);
	const laid = standing.filter(({ session }) => session !== null);
	return {
		toPublish: laid.filter(({ publishedAt }) => publishedAt === null).length,
		published: laid.filter(({ publishedAt }) => publishedAt !== null).length,
		notLaid: standing.length - laid.length
	};
}
