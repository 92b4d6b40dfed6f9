import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { listOf, orNothing, readForm, ticked } from './read-form';

const form = (...fields: [string, string][]) => {
	const data = new FormData();
	for (const [name, value] of fields) data.append(name, value);
	return data;
};

describe('reading a form', () => {
	it('nests dotted names and makes lists of numbered ones', () => {
		const schema = z.object({
			rooms: z.array(z.object({ name: z.string(), places: z.coerce.number() }))
		});
		const read = readForm(
			schema,
			form(
				['rooms.0.name', 'Long Floor'],
				['rooms.0.places', '18'],
				['rooms.1.name', 'Loft'],
				['rooms.1.places', '10']
			)
		);
		expect(read).toMatchObject({
			ok: true,
			data: {
				rooms: [
					{ name: 'Long Floor', places: 18 },
					{ name: 'Loft', places: 10 }
				]
			}
		});
	});

	it('reads a list that has one entry or none, a tick and an empty field', () => {
		const schema = z.object({
			days: listOf(z.string()),
			shared: ticked,
			note: orNothing(z.string().min(3))
		});
		expect(readForm(schema, form(['days', 'MO'], ['shared', 'on'], ['note', '']))).toMatchObject({
			ok: true,
			data: { days: ['MO'], shared: true, note: undefined }
		});
		expect(readForm(schema, form())).toMatchObject({ data: { days: [], shared: false } });
	});

	it('keeps what was typed, says one sentence a field, and forgets passwords', () => {
		const schema = z.object({ name: z.string().min(1), password: z.string().min(10) });
		expect(readForm(schema, form(['name', ''], ['password', 'short']))).toEqual({
			ok: false,
			values: { name: '' },
			errors: { name: 'Fill this in.', password: 'At least 10 characters.' }
		});
	});

	it('takes hostile names as names', () => {
		const schema = z.object({ a: z.string() });
		const read = readForm(
			schema,
			form(['a', 'x'], ['__proto__', 'y'], ['__proto__.z', 'y'], ['constructor.prototype.q', '1'])
		);
		expect(read.ok && read.data).toEqual({ a: 'x' });
		expect(({} as Record<string, unknown>).q).toBeUndefined();
	});

	it('leaves files out', () => {
		const data = form(['a', 'x']);
		data.append('a', new Blob(['y']), 'y.txt');
		expect(readForm(z.object({ a: z.string() }), data)).toMatchObject({ data: { a: 'x' } });
	});
});
