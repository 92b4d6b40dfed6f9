import pino from 'pino';

/** One line of JSON an entry, on standard output. Never a body, a query string, a cookie or a token. */
export const log = pino({
	level: process.env.LOG_LEVEL ?? 'info',
	base: undefined,
	timestamp: pino.stdTimeFunctions.isoTime
});
