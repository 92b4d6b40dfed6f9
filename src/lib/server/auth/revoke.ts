import { and, eq, isNull, ne } from 'drizzle-orm';
import { write, type Tx } from '../db';
import { signIns } from '../db/schema';

/** Ends one sign-in: its next request is nobody's. */
export async function revokeSignIn(tx: Tx, id: string, now: number): Promise<void> {
	await tx
		.update(signIns)
		.set({ revokedAt: now })
		.where(and(eq(signIns.id, id), isNull(signIns.revokedAt)));
}

/** Ends every sign-in of a person, but for `except`; roles, passwords and shut accounts cause it. */
export async function revokeSignInsOf(
	tx: Tx,
	personId: number,
	now: number,
	except?: string
): Promise<void> {
	await tx
		.update(signIns)
		.set({ revokedAt: now })
		.where(
			and(
				eq(signIns.personId, personId),
				isNull(signIns.revokedAt),
				...(except === undefined ? [] : [ne(signIns.id, except)])
			)
		);
}

export const signOut = (signInId: string, now: number): Promise<void> =>
	write((tx) => revokeSignIn(tx, signInId, now));

/** Signs a person out on every device, this one too. */
export const signOutEverywhere = (
	viewer: { personId: number },
	{ now }: { now: number }
): Promise<void> => write((tx) => revokeSignInsOf(tx, viewer.personId, now));
