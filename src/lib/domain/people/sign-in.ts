import type { Role } from './capabilities';

const minute = 60_000;
const hour = 60 * minute;
const day = 24 * hour;

/**
 * How long a sign-in lasts, in milliseconds. Staff: 12 h at most and 30 min idle, since they
 * see other people's data (goal G20 of our reliability figures). Members: 60 days and 14 idle,
 * on their own phone (common practice, no source).
 */
export const signInLimits = (held: readonly Role[]): { longestMs: number; idleMs: number } =>
	held.some((role) => role !== 'member')
		? { longestMs: 12 * hour, idleMs: 30 * minute }
		: { longestMs: 60 * day, idleMs: 14 * day };

export type SignInRow = {
	lastSeenAt: number;
	expiresAt: number;
	revokedAt: number | null;
};

/** Whether a sign-in still counts at `now` (epoch ms). At the limit itself it no longer does. */
export function stillCounts(signIn: SignInRow, held: readonly Role[], now: number): boolean {
	return (
		signIn.revokedAt === null &&
		now < signIn.expiresAt &&
		now < signIn.lastSeenAt + signInLimits(held).idleMs
	);
}
