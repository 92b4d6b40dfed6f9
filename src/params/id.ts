import type { ParamMatcher } from '@sveltejs/kit';

/** A row's number, within what SQLite and JSON both hold. */
export const match: ParamMatcher = (param) => /^[1-9]\d{0,14}$/.test(param);
