import { inTurn, writerConnection } from './write';

/** Moves the write-ahead log into the file, so that the file alone can be copied. */
export function checkpointDatabase(): Promise<unknown> {
	return inTurn(() => writerConnection().client.execute('PRAGMA wal_checkpoint(TRUNCATE)'));
}
