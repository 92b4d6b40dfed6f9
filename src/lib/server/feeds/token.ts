import { createHash, randomBytes } from 'node:crypto';

/** 256 bits, in characters that an address carries as they are. */
export const newToken = (): string => randomBytes(32).toString('base64url');

/** What is kept of a token: nobody who reads the database learns an address. */
export const hashOf = (token: string): string => createHash('sha256').update(token).digest('hex');
