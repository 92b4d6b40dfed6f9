import { z } from 'zod';
import { bookingBody, dayRange, rollBody } from '$lib/forms/api';
import * as shapes from './shapes';

/** The OpenAPI 3.1 document of the HTTP API, made from the schemas that read its requests. */
export function openApiDocument(origin: string, gymName: string) {
	return {
		openapi: '3.1.0',
		info: { title: `${gymName}, classes`, version: '1.0.0' },
		servers: [{ url: origin }],
		components: {
			securitySchemes: {
				signIn: {
					type: 'apiKey',
					in: 'cookie',
					name: 'session cookie',
					description: 'Set by POST /auth/callback/credentials with email and password'
				}
			},
			responses: { Problem: problemAnswer }
		},
		paths: {
			'/api/health': {
				get: operation('Whether the gym answers', z.object({ status: z.literal('ok') }))
			},
			'/api/openapi.json': {
				get: operation('This document', z.looseObject({ openapi: z.literal('3.1.0') }))
			},
			'/api/slots': {
				get: operation('Slots from a day to a day', shapes.slotsShape, { query: dayRange })
			},
			'/api/slots/{id}': { get: operation('One slot', shapes.oneSlotShape, { id: true }) },
			'/api/slots/{id}/kit': {
				get: operation('What limits a slot, and its kit for staff', shapes.kitShape, signed)
			},
			'/api/slots/{id}/bookings': {
				post: operation('Book a place or a turn', shapes.bookedShape, {
					...signed,
					body: bookingBody,
					repeat: true,
					status: 201
				})
			},
			'/api/bookings/{id}': {
				delete: operation('Give a place up', shapes.cancelledShape, { ...signed, repeat: true })
			},
			'/api/me/bookings': {
				get: operation('My bookings', shapes.myBookingsShape, { query: dayRange, signIn: true })
			},
			'/api/slots/{id}/roll': {
				get: operation('The roll', shapes.rollShape, signed),
				patch: operation('Mark who came', shapes.rollShape, { ...signed, body: rollBody })
			},
			'/api/stripe/webhook': {
				post: operation('What the payment service tells', shapes.receivedShape, {
					body: z.looseObject({ id: z.string(), type: z.string(), created: z.int() })
				})
			},
			'/feeds/{token}.ics': { get: feed }
		}
	};
}

type Details = {
	id?: boolean;
	signIn?: boolean;
	query?: z.ZodType;
	body?: z.ZodType;
	repeat?: boolean;
	status?: number;
};
const signed: Details = { id: true, signIn: true };

const schema = (shape: z.ZodType, io: 'input' | 'output' = 'output') => {
	const { $schema: _, ...rest } = z.toJSONSchema(shape, { io, unrepresentable: 'any' });
	return rest;
};
const content = (shape: z.ZodType) => ({ 'application/json': { schema: schema(shape) } });

const problemAnswer = {
	description: 'A problem document (RFC 9457)',
	content: { 'application/problem+json': { schema: schema(shapes.problemShape) } }
};

function operation(summary: string, answer: z.ZodType, details: Details = {}) {
	return {
		summary,
		parameters: parameters(details),
		...(details.signIn ? { security: [{ signIn: [] }] } : {}),
		...(details.body
			? {
					requestBody: {
						required: true,
						content: { 'application/json': { schema: schema(details.body, 'input') } }
					}
				}
			: {}),
		responses: {
			[details.status ?? 200]: { description: summary, content: content(answer) },
			default: { $ref: '#/components/responses/Problem' }
		}
	};
}

function parameters({ id, query, repeat }: Details) {
	const { properties = {}, required = [] } = query
		? (schema(query, 'input') as { properties?: object; required?: string[] })
		: {};
	return [
		...(id ? [{ name: 'id', in: 'path', required: true, schema: { type: 'integer' } }] : []),
		...Object.entries(properties).map(([name, shape]) => ({
			name,
			in: 'query',
			required: required.includes(name),
			schema: shape
		})),
		...(repeat ? [{ name: 'Idempotency-Key', in: 'header', schema: { type: 'string' } }] : [])
	];
}

const feed = {
	summary: 'A calendar (RFC 5545)',
	parameters: [{ name: 'token', in: 'path', required: true, schema: { type: 'string' } }],
	responses: {
		200: {
			description: 'The calendar',
			content: { 'text/calendar': { schema: { type: 'string' } } }
		},
		304: { description: 'Unchanged since the ETag that was sent' },
		404: { description: 'No such address, or it was revoked' }
	}
};
