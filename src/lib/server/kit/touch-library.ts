import { sql } from 'drizzle-orm';
import type { Tx } from '../db';
import { gyms } from '../db/schema';

/** Raises the library's version in the transaction that changes movements, variations or kit groups. */
export async function touchLibrary(tx: Tx): Promise<void> {
	await tx.update(gyms).set({ libraryVersion: sql`${gyms.libraryVersion} + 1` });
}
