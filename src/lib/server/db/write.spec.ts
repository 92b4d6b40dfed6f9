import { sql } from 'drizzle-orm';
import { describe, expect, it } from 'vitest';
import { useDatabase } from '../../../../tests/support/database';
import { db, write } from '.';
import { auditEntries, rooms } from './schema';

const room = (name: string) => ({ name, places: 10, createdAt: 1 });

describe('the one writer', () => {
	useDatabase();

	it('takes fifty writers at once, first come first served, and loses none', async () => {
		const order: number[] = [];
		await Promise.all(
			Array.from({ length: 50 }, (_, i) =>
				write(async (tx) => {
					await tx.insert(rooms).values(room(`Room ${i}`));
					order.push(i);
				})
			)
		);
		expect(order).toEqual(Array.from({ length: 50 }, (_, i) => i));
		expect(await db.select({ n: sql<number>`count(*)` }).from(rooms)).toEqual([{ n: 50 }]);
	});

	it('undoes everything of a write that throws, and goes on', async () => {
		await expect(
			write(async (tx) => {
				await tx.insert(rooms).values(room('Loft'));
				throw new Error('stop');
			})
		).rejects.toThrow('stop');
		await write((tx) => tx.insert(rooms).values(room('Yard')));
		expect((await db.select().from(rooms)).map((r) => r.name)).toEqual(['Yard']);
	});

	it('refuses a write inside a write instead of waiting for itself', async () => {
		await expect(write(() => write((tx) => tx.insert(rooms).values(room('Loft'))))).rejects.toThrow(
			'write() inside write()'
		);
	});

	it('refuses a write through the reader, inside a write and outside', async () => {
		await expect(db.insert(rooms).values(room('Loft'))).rejects.toMatchObject({
			cause: { code: 'SQLITE_READONLY' }
		});
		await expect(write(() => db.insert(rooms).values(room('Loft')))).rejects.toMatchObject({
			cause: { code: 'SQLITE_READONLY' }
		});
	});

	it('answers reads while a write is open', async () => {
		let seen = -1;
		await write(async (tx) => {
			await tx.insert(rooms).values(room('Loft'));
			seen = (await db.select().from(rooms)).length;
		});
		expect(seen).toBe(0);
	});

	it('keeps foreign keys on and every commit synchronous', async () => {
		const pragmas = await write(async (tx) => ({
			keys: await tx.get<{ foreign_keys: number }>(sql`pragma foreign_keys`),
			synchronous: await tx.get<{ synchronous: number }>(sql`pragma synchronous`)
		}));
		expect(pragmas).toEqual({ keys: { foreign_keys: 1 }, synchronous: { synchronous: 2 } });
	});

	it('never changes or drops a line of the audit log', async () => {
		await write((tx) => tx.insert(auditEntries).values({ at: 1, verb: 'v', noun: 'n' }));
		const change = write((tx) => tx.update(auditEntries).set({ verb: 'w' }));
		await expect(change).rejects.toMatchObject({
			cause: { message: expect.stringContaining('append-only') }
		});
		const drop = write((tx) => tx.delete(auditEntries));
		await expect(drop).rejects.toMatchObject({
			cause: { message: expect.stringContaining('append-only') }
		});
	});
});
