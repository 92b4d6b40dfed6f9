import { createClient, type Client, type Transaction, type TransactionMode } from '@libsql/client';
import { drizzle, type LibSQLDatabase } from 'drizzle-orm/libsql';
import * as schema from './schema';

export type Db = LibSQLDatabase<typeof schema> & { $client: Client };
export type Tx = Parameters<Parameters<Db['transaction']>[0]>[0];
/** What a query can run on: the reader, or the transaction of the command that asks. */
export type Queryable = Db | Tx;

export type Connection = {
	client: Client;
	db: Db;
	/** The client's transaction under way, or its last: Drizzle keeps it to itself. */
	transaction: () => Transaction | null;
};

/**
 * Opens one connection to `url` (a `file:` path or a remote libSQL address).
 * `concurrency` is 1 because a PRAGMA reaches one connection of a pool; `timeout` is 0
 * because libSQL waits for locks synchronously and would freeze the process.
 */
export async function connect(
	url: string,
	pragmas: string[],
	authToken?: string
): Promise<Connection> {
	const client = createClient({ url, authToken, concurrency: 1, timeout: 0 });
	await applyPragmas(client, url, pragmas);
	let last: Transaction | null = null;
	const begin = client.transaction.bind(client);
	client.transaction = async (mode?: TransactionMode) => (last = await begin(mode));
	return { client, db: drizzle(client, { schema }), transaction: () => last };
}

/** Pragmas belong to a connection: they are applied again after each `reconnect()`. */
export async function applyPragmas(client: Client, url: string, pragmas: string[]): Promise<void> {
	if (!url.startsWith('file:')) return;
	for (const pragma of pragmas) await client.execute(`PRAGMA ${pragma}`);
}

/** FULL: an acknowledged booking survives power loss, not only a crash of the process. */
export const writerPragmas = ['journal_mode=WAL', 'synchronous=FULL', 'foreign_keys=ON'];
/** `query_only` makes a write through the reader an error instead of a deadlock. */
export const readerPragmas = ['query_only=ON', 'foreign_keys=ON'];
