import { and, asc, eq, gt } from 'drizzle-orm';
import { describe, expect, it } from 'vitest';
import { useDatabase } from '../../../../tests/support/database';
import { db, write } from '.';
import { prepared } from './prepared';
import { classTypes, rooms } from './schema';

const roomsOver = prepared<{ places: number; name: string }>()((q, at) =>
	q
		.select({ name: rooms.name, at: rooms.createdAt })
		.from(rooms)
		.where(and(gt(rooms.places, at('places')), gt(rooms.name, at('name'))))
		.orderBy(asc(rooms.name))
);
const addRoom = prepared<{ name: string; places: number }>()((q, at) =>
	q
		.insert(rooms)
		.values({ name: at('name'), places: at('places'), createdAt: 7 })
		.returning({ id: rooms.id })
);
const roomBesideType = prepared<{ id: number }>()((q, at) =>
	q
		.select({ room: rooms.name, claims: classTypes.defaultClaims })
		.from(rooms)
		.leftJoin(classTypes, eq(classTypes.id, at('id')))
);

describe('a query that is built once', () => {
	useDatabase();

	it('answers as the query that is built each time does, with each call its own values', async () => {
		await write((tx) =>
			tx.insert(rooms).values([
				{ name: 'Loft', places: 10, createdAt: 7 },
				{ name: 'Yard', places: 4, createdAt: 7 }
			])
		);
		expect(await roomsOver(db, { places: 3, name: 'A' })).toEqual(
			await db.select({ name: rooms.name, at: rooms.createdAt }).from(rooms)
		);
		expect(await roomsOver(db, { places: 4, name: 'A' })).toEqual([{ name: 'Loft', at: 7 }]);
		expect(await roomsOver(db, { places: 3, name: "M' or 1=1 --" })).toEqual([
			{ name: 'Yard', at: 7 }
		]);
	});

	it('runs in the transaction it is given: sees what that wrote, and is undone with it', async () => {
		const undone = write(async (tx) => {
			const [row] = await addRoom(tx, { name: 'Pit', places: 6 });
			expect(row!.id).toBeGreaterThan(0);
			expect(await roomsOver(tx, { places: 5, name: 'A' })).toHaveLength(1);
			throw new Error('stop');
		});
		await expect(undone).rejects.toThrow('stop');
		expect(await roomsOver(db, { places: 0, name: '' })).toEqual([]);
	});

	it('reads an outer join with nothing on the other side as null', async () => {
		await write((tx) => addRoom(tx, { name: 'Pit', places: 6 }));
		expect(await roomBesideType(db, { id: 99 })).toEqual([{ room: 'Pit', claims: null }]);
	});

	it('cannot write through the reader', async () => {
		await expect(addRoom(db, { name: 'Pit', places: 6 })).rejects.toThrow(/readonly|read-only/i);
	});
});
