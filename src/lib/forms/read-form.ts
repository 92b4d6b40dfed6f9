import { z } from 'zod';
import { fieldSentence } from '$lib/wording/fields';

/** What was typed, to fill the form again: a string a field, or several where a field repeats. */
export type Typed = Record<string, string | string[]>;

export type ReadForm<Data> =
	| {
			ok: true;
			data: Data;
			/** As typed, for a refusal that comes later. */
			typed: Typed;
	  }
	| {
			ok: false;
			values: Typed;
			/** One sentence a field, by its path: "name", "rooms.0.places". */
			errors: Record<string, string>;
	  };

/**
 * Reads a form by its schema. Fields named "rooms.0.name" nest; a field that repeats is a list.
 * Passwords are never handed back.
 */
export function readForm<Data>(schema: z.ZodType<Data>, form: FormData): ReadForm<Data> {
	const values = typed(form);
	const read = schema.safeParse(nest(values));
	for (const name of Object.keys(values)) if (/password/i.test(name)) delete values[name];
	if (read.success) return { ok: true, data: read.data, typed: values };
	const errors: Record<string, string> = {};
	for (const issue of read.error.issues) errors[issue.path.join('.')] ??= fieldSentence(issue);
	return { ok: false, values, errors };
}

/** A field that may come never, once or often. */
export const listOf = <Item extends z.ZodType>(item: Item) =>
	z.preprocess((value) => (value === undefined ? [] : [value].flat()), z.array(item));

/** A tick box: present when ticked. */
export const ticked = z.preprocess((value) => value !== undefined, z.boolean());

/** A field left empty is not there. */
export const orNothing = <Inner extends z.ZodType>(inner: Inner) =>
	z.preprocess((value) => (value === '' ? undefined : value), inner.optional());

function typed(form: FormData): Typed {
	const values: Typed = Object.create(null);
	for (const name of new Set(form.keys())) {
		const texts = form.getAll(name).filter((value) => typeof value === 'string');
		const [only] = texts;
		if (only !== undefined) values[name] = texts.length > 1 ? texts : only;
	}
	return values;
}

type Nested = { [key: string]: Nested | Nested[] | string | string[] };
const longestList = 200;

/** "rooms.0.name" becomes the name of the first of a list of rooms. */
function nest(values: Typed): Nested {
	const root: Nested = Object.create(null);
	for (const [name, value] of Object.entries(values)) {
		const path = name.split('.');
		let at: Nested = root;
		for (const key of path.slice(0, -1)) {
			const next = at[key];
			at = at[key] = isNested(next) ? next : Object.create(null);
		}
		at[path.at(-1) ?? name] = value;
	}
	return withLists(root);
}

/** What has numbers only for keys was a list. */
function withLists(node: Nested): Nested {
	for (const [key, value] of Object.entries(node)) {
		if (!isNested(value)) continue;
		const inner = withLists(value);
		const keys = Object.keys(inner);
		const isList = keys.every((k) => /^\d{1,4}$/.test(k)) && keys.length <= longestList;
		node[key] = isList ? (Object.values(inner) as Nested[]) : inner;
	}
	return node;
}

const isNested = (value: unknown): value is Nested =>
	typeof value === 'object' && value !== null && !Array.isArray(value);
