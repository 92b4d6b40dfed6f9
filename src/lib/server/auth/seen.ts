import { eq } from 'drizzle-orm';
import { write } from '../db';
import { signIns } from '../db/schema';

/** Notes that a device was used at `now`. */
export async function seen(signInId: string, now: number): Promise<void> {
	await write((tx) => tx.update(signIns).set({ lastSeenAt: now }).where(eq(signIns.id, signInId)));
}
