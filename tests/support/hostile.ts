import fc from 'fast-check';
import { z } from 'zod';

/** Words that have broken parsers, queries and pages before (common practice, no source). */
const hostileWords = [
	'',
	' ',
	'0',
	'-1',
	'1e309',
	'NaN',
	'null',
	'undefined',
	'__proto__',
	'constructor',
	'toString',
	"' or 1=1 --",
	'"; drop table people; --',
	'<script>alert(1)</script>',
	'${7*7}',
	'../../../../etc/passwd',
	'%00',
	'\u0000',
	'\ud800',
	'\r\nSet-Cookie: a=b',
	'ﷺ'.repeat(200),
	'9'.repeat(400),
	'2026-02-30',
	'0000-00-00',
	'-271821-04-20',
	'Africa/Nowhere',
	'FREQ=SECONDLY;COUNT=1000000000'
];

const word = fc.oneof(fc.constantFrom(...hostileWords), fc.string({ maxLength: 60 }));
const number = fc.oneof(
	fc.constantFrom(0, -1, 1, 2, 0.5, 2 ** 31, 2 ** 53, 1e308, -1e308),
	fc.integer({ min: -10, max: 200 })
);
const anything: fc.Arbitrary<unknown> = fc.oneof(word, number, fc.jsonValue({ maxDepth: 3 }));

export type HostileBody = { type: string | null; body: string | Uint8Array<ArrayBuffer> };

const formType = 'application/x-www-form-urlencoded';
const types = [
	formType,
	'application/json',
	'multipart/form-data; boundary=cut',
	'multipart/form-data',
	'text/plain',
	'application/xml',
	'application/json; charset=utf-16',
	'nonsense',
	null
];

/** Half of the bodies have the shape of one of our own schemas, the rest has none. */
export const hostileBody = (schemas: z.ZodType[]): fc.Arbitrary<HostileBody> =>
	fc.oneof(
		{ weight: 5, arbitrary: shaped(schemas) },
		{ weight: 1, arbitrary: bytes },
		{ weight: 1, arbitrary: brokenMultipart },
		{ weight: 1, arbitrary: deep },
		{ weight: 2, arbitrary: anything.map(asJson) }
	);

export const hostileWord = word;

const asJson = (value: unknown): HostileBody => ({
	type: 'application/json',
	body: JSON.stringify(value) ?? 'undefined'
});

const bytes = fc
	.record({ type: fc.constantFrom(...types), raw: fc.uint8Array({ maxLength: 600 }) })
	.map(({ type, raw }) => ({ type, body: new Uint8Array(raw) }));

const brokenMultipart = fc
	.array(
		fc.constantFrom(
			'--cut\r\n',
			'--cut--\r\n',
			'content-disposition: form-data; name="a"\r\n',
			'content-disposition: form-data; name="a"; filename="../../a.html"\r\n',
			'content-disposition: form-data\r\n',
			'content-type: text/html; charset=nonsense\r\n',
			'\r\n',
			'\u0000',
			'x'
		),
		{ maxLength: 12 }
	)
	.map((parts) => ({ type: 'multipart/form-data; boundary=cut', body: parts.join('') }));

const deep = fc
	.record({ open: fc.constantFrom('[', '{"a":'), levels: fc.constantFrom(21, 200, 50_000) })
	.map(({ open, levels }) => ({
		type: 'application/json',
		body: open.repeat(levels) + '1' + (open === '[' ? ']' : '}').repeat(levels)
	}));

function shaped(schemas: z.ZodType[]): fc.Arbitrary<HostileBody> {
	const values = schemas.map((schema) => like(jsonSchemaOf(schema)));
	return fc
		.record({ value: fc.oneof(anything, ...values), asForm: fc.boolean() })
		.map(({ value, asForm }) => (asForm ? { type: formType, body: formOf(value) } : asJson(value)));
}

type Shape = {
	type?: string;
	enum?: unknown[];
	const?: unknown;
	anyOf?: Shape[];
	oneOf?: Shape[];
	allOf?: Shape[];
	properties?: Record<string, Shape>;
	items?: Shape;
	format?: string;
};

function jsonSchemaOf(schema: z.ZodType): Shape {
	return z.toJSONSchema(schema, { io: 'input', unrepresentable: 'any' }) as Shape;
}

/** Values that mostly fit a schema, with a hostile one in some place of every fourth. */
function like(shape: Shape): fc.Arbitrary<unknown> {
	return fc.oneof({ weight: 4, arbitrary: fitting(shape) }, { weight: 1, arbitrary: anything });
}

function fitting(shape: Shape): fc.Arbitrary<unknown> {
	const choices = shape.anyOf ?? shape.oneOf ?? shape.allOf;
	if (choices && choices.length > 0) return fc.oneof(...choices.map(like));
	if (shape.const !== undefined) return fc.constant(shape.const);
	if (shape.enum && shape.enum.length > 0) return fc.constantFrom(...shape.enum);
	switch (shape.type) {
		case 'object': {
			const fields = Object.entries(shape.properties ?? {}).map(([k, v]) => [k, like(v)] as const);
			return fc.record(Object.fromEntries(fields), { requiredKeys: [] });
		}
		case 'array':
			return fc.array(like(shape.items ?? {}), { maxLength: 4 });
		case 'integer':
		case 'number':
			return number;
		case 'boolean':
			return fc.boolean();
		case 'string':
			return shape.format === 'email' ? fc.constant('somebody@gym.test') : word;
		default:
			return anything;
	}
}

/** Nested values under dotted names, as our own forms send them. */
function formOf(value: unknown): string {
	const form = new URLSearchParams();
	add('', value);
	return form.toString();

	function add(path: string, at: unknown): void {
		if (at !== null && typeof at === 'object') {
			for (const [key, inner] of Object.entries(at)) add(path ? `${path}.${key}` : key, inner);
		} else if (path) form.append(path, String(at).replace(/[\ud800-\udfff]/g, '?'));
	}
}
