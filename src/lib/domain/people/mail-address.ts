import { z } from 'zod';

/**
 * One mail address in lower case: plain ASCII without quotes, commas or controls, so that no
 * mail program can read a second recipient or a header into it. 254 characters at most (RFC 5321).
 */
export const mailAddress = z
	.string()
	.trim()
	.toLowerCase()
	.max(254)
	.regex(/^[a-z0-9.!#$%&'*+/=?^_`{|}~-]{1,64}@[a-z0-9-]+(?:\.[a-z0-9-]+)+$/);
