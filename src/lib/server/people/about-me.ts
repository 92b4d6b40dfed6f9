import { eq } from 'drizzle-orm';
import { db, write } from '../db';
import { people } from '../db/schema';
import type { Viewer } from '../guard';

export type AboutMe = {
	name: string;
	email: string | null;
	phone: string | null;
	note: string | null;
};

export async function aboutMe(personId: number): Promise<AboutMe> {
	const [me] = await db
		.select({ name: people.name, email: people.email, phone: people.phone, note: people.note })
		.from(people)
		.where(eq(people.id, personId));
	if (!me) throw new Error('a viewer without a row');
	return me;
}

/** Changes one's own name, phone and what the coaches should know. */
export async function changeAboutMe(
	viewer: Pick<Viewer, 'personId'>,
	{ name, phone, note }: { name: string; phone: string; note: string }
): Promise<void> {
	await write((tx) =>
		tx
			.update(people)
			.set({ name, phone: phone || null, note: note || null })
			.where(eq(people.id, viewer.personId))
	);
}
