import { AsyncLocalStorage } from 'node:async_hooks';
import type { Transaction } from '@libsql/client';
import {
	applyPragmas,
	writerPragmas,
	type Connection,
	type Queryable,
	type Tx
} from './connection';

/** Incidents after which the process gives up: every reconnect leaks descriptors. */
const busyLimit = 20;

let target: { connection: Connection; url: string } | null = null;
let queue: Promise<unknown> = Promise.resolve();
let busyCount = 0;
const writing = new AsyncLocalStorage<true>();

/**
 * The only way to write: one transaction at a time, first come first served in this process.
 * Never await a network inside; pass `tx` on. Throws when called inside another write,
 * which would wait for itself. A refusal returned by `work` commits what it wrote: refuse first.
 */
export function write<T>(work: (tx: Tx) => Promise<T>): Promise<T> {
	if (writing.getStore()) {
		throw new Error('write() inside write(): pass the transaction on instead');
	}
	return inTurn(() => writing.run(true, () => transact(work)));
}

/** Runs `step` alone among all writes: migrations, checkpoints and backups queue here too. */
export function inTurn<T>(step: () => Promise<T>): Promise<T> {
	const turn = queue.then(step);
	queue = turn.catch(() => undefined);
	return turn;
}

async function transact<T>(work: (tx: Tx) => Promise<T>): Promise<T> {
	try {
		return await begin(work);
	} catch (error) {
		if (!isBusy(error)) throw error;
		await recover();
		return await begin(work);
	}
}

/** One transaction is open at a time, so the connection's last is the one that just began. */
function begin<T>(work: (tx: Tx) => Promise<T>): Promise<T> {
	const { connection } = open();
	return connection.db.transaction((tx) => {
		raw.set(tx, connection.transaction()!);
		return work(tx);
	});
}

const raw = new WeakMap<object, Transaction>();

/** The client's own transaction under Drizzle's; none for the reader. For `prepared` alone. */
export const transactionOf = (q: Queryable): Transaction | undefined => raw.get(q);

/**
 * After SQLITE_BUSY the connection may report rows that never commit (libsql-client-ts #352):
 * it is replaced at once, before any other use, and counted as an incident.
 */
async function recover(): Promise<void> {
	const { connection, url } = open();
	busyCount += 1;
	if (busyCount > busyLimit) {
		process.stderr.write('kithour: the database file is held by another process; stopping\n');
		process.exit(1);
	}
	await connection.client.reconnect();
	await applyPragmas(connection.client, url, writerPragmas);
}

function isBusy(error: unknown): boolean {
	for (let e = error; e instanceof Error; e = e.cause) {
		const code = 'code' in e ? String(e.code) : '';
		if (code.startsWith('SQLITE_BUSY') || code === 'SQLITE_LOCKED') return true;
	}
	return false;
}

function open() {
	if (!target) throw new Error('the database is not open');
	return target;
}

export function writeTo(connection: Connection, url: string): void {
	target = { connection, url };
}

/** Lets the writes under way finish, then refuses further ones. */
export async function stopWriting(): Promise<void> {
	await queue;
	target = null;
}

/** The writer itself, for migrations alone. */
export const writerConnection = (): Connection => open().connection;
