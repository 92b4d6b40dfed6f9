import { connect, readerPragmas, writerPragmas, type Connection, type Db } from './connection';
import { stopWriting, writeTo } from './write';

export type { Db, Queryable, Tx } from './connection';
export { write } from './write';

/** The reader. Queries import it; it refuses to write. Live binding: set by `openDatabase`. */
export let db: Db;

let reader: Connection | null = null;
let writer: Connection | null = null;

/**
 * Opens the writer and the reader of the one database of this process.
 * `url` is a `file:` path or a remote libSQL address. A second call closes the first.
 */
export async function openDatabase(url: string, authToken?: string): Promise<void> {
	await closeDatabase();
	writer = await connect(url, writerPragmas, authToken);
	reader = await connect(url, readerPragmas, authToken);
	db = reader.db;
	writeTo(writer, url);
}

export async function closeDatabase(): Promise<void> {
	await stopWriting();
	reader?.client.close();
	writer?.client.close();
	reader = writer = null;
}
