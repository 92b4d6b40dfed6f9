import { and, asc, eq, isNull, sql } from 'drizzle-orm';
import { db } from '../db';
import {
	kitGroups,
	movements,
	sessionRevisions,
	trainingSessions,
	variationNeeds,
	variations
} from '../db/schema';

export type MovementCard = {
	id: number;
	name: string;
	pattern: string;
	muscles: string[];
	rungs: number;
	alwaysNeedsKit: boolean;
};

export const movementCards = (): Promise<MovementCard[]> =>
	db
		.select({
			id: movements.id,
			name: movements.name,
			pattern: movements.pattern,
			muscles: movements.muscles,
			alwaysNeedsKit: movements.alwaysNeedsKit,
			rungs: sql<number>`(select count(*) from variations v where v.movement_id = movements.id and v.archived_at is null)`
		})
		.from(movements)
		.where(isNull(movements.archivedAt))
		.orderBy(asc(movements.name));

export type MovementPage = typeof movements.$inferSelect & {
	ladder: {
		id: number;
		name: string;
		needs: { kitGroupId: number; quantity: number; peoplePerPiece: number }[];
	}[];
	/** Sessions whose newest revision has it. */
	usedIn: { id: number; title: string }[];
};

export async function movementPage(id: number): Promise<MovementPage | null> {
	const movement = await db
		.select()
		.from(movements)
		.where(and(eq(movements.id, id), isNull(movements.archivedAt)))
		.get();
	if (!movement) return null;
	const [rungs, needs, sessions] = await Promise.all([
		db
			.select({ id: variations.id, name: variations.name })
			.from(variations)
			.where(and(eq(variations.movementId, id), isNull(variations.archivedAt)))
			.orderBy(asc(variations.rung)),
		db
			.select({
				variationId: variationNeeds.variationId,
				kitGroupId: variationNeeds.kitGroupId,
				quantity: variationNeeds.quantity,
				peoplePerPiece: variationNeeds.peoplePerPiece
			})
			.from(variationNeeds)
			.innerJoin(variations, eq(variations.id, variationNeeds.variationId))
			.where(eq(variations.movementId, id)),
		db
			.select({
				id: trainingSessions.id,
				title: trainingSessions.title,
				content: sessionRevisions.content
			})
			.from(trainingSessions)
			.innerJoin(
				sessionRevisions,
				and(
					eq(sessionRevisions.trainingSessionId, trainingSessions.id),
					eq(sessionRevisions.number, trainingSessions.revisionNumber)
				)
			)
			.where(isNull(trainingSessions.archivedAt))
			.orderBy(asc(trainingSessions.title))
	]);
	return {
		...movement,
		ladder: rungs.map((rung) => ({
			...rung,
			needs: needs
				.filter(({ variationId }) => variationId === rung.id)
				.map(({ variationId: _, ...need }) => need)
		})),
		usedIn: sessions
			.filter(({ content }) =>
				content.blocks.some(({ prescriptions }) => prescriptions.some((p) => p.movementId === id))
			)
			.map(({ id: sessionId, title }) => ({ id: sessionId, title }))
	};
}

export const groupChoices = () =>
	db
		.select({ id: kitGroups.id, name: kitGroups.name, hasLoads: kitGroups.hasLoads })
		.from(kitGroups)
		.where(isNull(kitGroups.archivedAt))
		.orderBy(asc(kitGroups.position));
