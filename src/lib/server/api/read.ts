import type { RequestEvent } from '@sveltejs/kit';
import type { z } from 'zod';
import { fieldErrors } from '$lib/forms/api';
import { fieldSentence } from '$lib/wording/fields';
import { problem } from '../refuse';
import { safeJson } from '../safe-body';

type Read<Data> = { ok: true; data: Data } | { ok: false; answer: Response };

/** A JSON body by its schema, or the problem document that says which field is wrong. */
export async function readBody<Data>(
	event: Pick<RequestEvent, 'request'>,
	schema: z.ZodType<Data>
): Promise<Read<Data>> {
	return checked(schema, await safeJson(event));
}

/** The query of an address by its schema. */
export const readQuery = <Data>(url: URL, schema: z.ZodType<Data>): Read<Data> =>
	checked(schema, Object.fromEntries(url.searchParams));

function checked<Data>(schema: z.ZodType<Data>, value: unknown): Read<Data> {
	const read = schema.safeParse(value);
	if (read.success) return { ok: true, data: read.data };
	const errors = fieldErrors(read.error, fieldSentence);
	return { ok: false, answer: problem({ code: 'bad-input', errors }) };
}
