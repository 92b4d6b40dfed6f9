import { integer } from 'drizzle-orm/sqlite-core';

/** A row's own number, never used again after a delete. */
export const rowId = () => integer('id').primaryKey({ autoIncrement: true });

/** An instant: milliseconds since 1970 in UTC, always from the injected clock. */
export const instant = (name: string) => integer(name);

export const flag = (name: string) => integer(name, { mode: 'boolean' }).notNull().default(false);
