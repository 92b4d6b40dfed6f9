import { eq } from 'drizzle-orm';
import { write } from '../db';
import { people } from '../db/schema';

/** A person's own choice of light or dark; null leaves it to the device. */
export async function setTheme(
	viewer: { personId: number },
	theme: 'light' | 'dark' | null
): Promise<void> {
	await write((tx) => tx.update(people).set({ theme }).where(eq(people.id, viewer.personId)));
}
