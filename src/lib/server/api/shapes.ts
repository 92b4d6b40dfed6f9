import { z } from 'zod';

/** What the API answers, for the OpenAPI document and for tests that hold the answers to it. */

const instant = z.iso.datetime({ offset: true });
const named = z.object({ id: z.number(), name: z.string() });
const status = z.enum([
	'held',
	'booked',
	'waitlisted',
	'attended',
	'no-show',
	'cancelled',
	'late-cancelled',
	'released'
]);

const block = z.object({
	title: z.string(),
	startS: z.number(),
	endS: z.number(),
	effort: z.number().int().min(1).max(5)
});

const ownBooking = z.object({ id: z.number(), status, position: z.number().optional() });

export const slotShape = z.object({
	id: z.number(),
	startsAt: instant,
	endsAt: instant,
	title: z.string(),
	classType: named,
	room: named,
	coaches: z.array(named),
	status: z.enum(['scheduled', 'cancelled']),
	places: z.object({
		limit: z.number(),
		limitedBy: z.enum(['room', 'coach', 'kit', 'set']),
		booked: z.number(),
		held: z.number(),
		waitlisted: z.number(),
		free: z.number()
	}),
	blocks: z.array(block).optional(),
	myBooking: ownBooking.optional()
});

export const sessionShape = z.object({
	id: z.number(),
	title: z.string(),
	aim: z.string(),
	blocks: z.array(
		block.extend({
			kind: z.string(),
			prescriptions: z.array(
				z.object({
					id: z.string(),
					movement: named,
					variation: named,
					choices: z.array(named),
					cautions: z.string()
				})
			)
		})
	)
});

export const slotsShape = z.object({ slots: z.array(slotShape) });
export const oneSlotShape = slotShape.extend({ session: sessionShape.optional() });

export const kitShape = z.object({
	limit: z.number(),
	limitedWithRegressions: z.number().optional(),
	limitedBy: z.enum(['room', 'coach', 'kit', 'set']),
	bottleneck: z
		.object({ item: z.string(), from: instant, to: instant, short: z.number() })
		.nullable()
		.optional(),
	lanes: z
		.array(
			z.object({
				item: z.string(),
				inService: z.number(),
				claims: z.array(
					z.object({ slotId: z.number(), from: instant, to: instant, count: z.number() })
				)
			})
		)
		.optional(),
	remedies: z
		.array(z.object({ kind: z.string(), places: z.number(), people: z.number() }))
		.optional()
});

export const bookedShape = z.object({
	booking: z.object({
		id: z.number(),
		status: z.enum(['booked', 'waitlisted', 'held']),
		position: z.number().optional(),
		checkoutUrl: z.string().optional()
	}),
	offer: z.record(z.string(), z.number()).optional()
});

export const cancelledShape = z.object({
	booking: z.object({ id: z.number(), status: z.enum(['cancelled', 'late-cancelled']) })
});

export const myBookingsShape = z.object({
	bookings: z.array(
		z.object({ id: z.number(), status, position: z.number().optional(), slot: slotShape })
	)
});

export const rollShape = z.object({
	slotId: z.number(),
	roll: z.array(
		z.object({
			bookingId: z.number(),
			member: named,
			status,
			late: z.boolean(),
			at: instant.optional(),
			position: z.number().optional()
		})
	)
});

export const problemShape = z.object({
	type: z.string(),
	title: z.string(),
	status: z.number(),
	detail: z.string(),
	code: z.string(),
	facts: z.record(z.string(), z.union([z.string(), z.number()])).optional(),
	errors: z.record(z.string(), z.string()).optional()
});

/** An event of the payment service is stored; each acts once. */
export const receivedShape = z.object({ received: z.literal(true) });
