import { capabilitiesOf } from '$lib/domain/people/capabilities';
import { stillCounts } from '$lib/domain/people/sign-in';
import type { Viewer } from '../guard';
import { log } from '../log';
import { readClaim, type Claim } from './cookie';
import { findSignIn, type FoundSignIn } from './queries';
import { seen } from './seen';

/** Idle time is counted in minutes, so the row is touched once a minute at most. */
const touchEveryMs = 60_000;

export type LoadedViewer = { viewer: Viewer; theme: 'light' | 'dark' | null };

/**
 * Whoever holds this cookie, with the roles that they have at this moment; null when the
 * sign-in was revoked, ran out or idled, or the account is shut.
 */
export async function loadViewer(
	cookie: string | undefined,
	now: number
): Promise<LoadedViewer | null> {
	const claim = await readClaim(cookie);
	if (!claim) return null;
	const found = await findSignIn(claim.signInId);
	if (!found || !holds(found, claim, now)) return null;
	if (now - found.lastSeenAt >= touchEveryMs) touch(claim.signInId, now);
	return {
		theme: found.theme,
		viewer: {
			personId: found.personId,
			name: found.name,
			email: found.email,
			roles: found.roles,
			capabilities: capabilitiesOf(found.roles),
			signInId: claim.signInId
		}
	};
}

const holds = (found: FoundSignIn, claim: Claim, now: number) =>
	found.personId === claim.personId &&
	found.disabledAt === null &&
	stillCounts(found, found.roles, now);

/** A page is never refused because this could not be written: a full disk still answers reads. */
function touch(signInId: string, now: number): void {
	seen(signInId, now).catch((error: unknown) => log.error({ err: error }, 'sign-in not touched'));
}
