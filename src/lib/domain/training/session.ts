import { z } from 'zod';
import { refuse, type Refused } from '../refusal';
import { formats } from './length';
import { checkSession } from './session-faults';
import { parseTempo } from './tempo';

export const blockKinds = [
	'warm-up',
	'opener',
	'skill',
	'strength',
	'circuit',
	'conditioning',
	'finisher',
	'cool-down'
] as const;
export type BlockKind = (typeof blockKinds)[number];

export const mostBlocks = 40;
export const mostPrescriptions = 30;
/** Twelve hours: no class is longer. */
const longestS = 43_200;

const whole = (least: number, most: number) => z.int().min(least).max(most);
const amount = (most: number) => z.number().positive().max(most);
/** Ids are keys of the choices that bookings keep: none may be a name that every object has. */
const id = z
	.string()
	.regex(/^[A-Za-z0-9_-]{1,40}$/)
	.refine((text) => !(text in Object.prototype), 'bad-id');
const note = z.string().trim().max(500);
const rowId = z.int().positive();

const load = z.discriminatedUnion('kind', [
	z.strictObject({ kind: z.literal('any') }),
	z.strictObject({ kind: z.literal('kg'), minKg: amount(500), maxKg: amount(500) })
]);

const drop = z.strictObject({
	belowReps: whole(1, 100),
	to: z.union([z.literal('next-regression'), rowId]),
	note: note.optional()
});

const prescription = z.strictObject({
	id,
	movementId: rowId,
	variationId: rowId,
	sets: whole(1, 50).optional(),
	reps: whole(1, 1000).optional(),
	expectedReps: whole(1, 1000).optional(),
	seconds: whole(1, longestS).optional(),
	metres: amount(100_000).optional(),
	metresPerSecond: amount(20).optional(),
	calories: amount(5000).optional(),
	caloriesPerMinute: amount(100).optional(),
	perSide: z.boolean(),
	tempo: z
		.string()
		.refine((text) => parseTempo(text).ok, 'bad-tempo')
		.optional(),
	perRepS: amount(120).optional(),
	restS: whole(0, 3600).optional(),
	load,
	drop: drop.optional(),
	note: note.optional()
});

const block = z.strictObject({
	id,
	kind: z.enum(blockKinds),
	title: z.string().trim().max(80).optional(),
	format: z.enum(formats),
	rotation: z.enum(['together', 'split']),
	waves: whole(1, 6),
	setUpS: whole(0, 3600),
	typedS: whole(0, longestS).optional(),
	changeoverS: whole(0, 3600).optional(),
	rounds: whole(1, 100).optional(),
	intervalS: whole(1, 3600).optional(),
	workS: whole(1, 3600).optional(),
	restS: whole(0, 3600).optional(),
	betweenS: whole(0, 3600).optional(),
	repeats: whole(1, 50).optional(),
	capS: whole(1, longestS).optional(),
	note: note.optional(),
	prescriptions: z.array(prescription).max(mostPrescriptions)
});

/**
 * A training session as a revision keeps it. Times are whole seconds, loads kilograms. A block and
 * a prescription have ids of their own, once in a session: bookings hang their choices on them.
 * What a format cannot do without is checked last; each fault's message is its code.
 */
export const sessionContent = z
	.strictObject({
		title: z.string().trim().min(1).max(120),
		aim: z.string().trim().max(500),
		blocks: z.array(block).min(1).max(mostBlocks)
	})
	.superRefine(checkSession);

export type SessionContent = z.infer<typeof sessionContent>;
export type Block = SessionContent['blocks'][number];
export type Prescription = Block['prescriptions'][number];
export type LoadRule = Prescription['load'];
export type DropRule = NonNullable<Prescription['drop']>;

/** What is wrong, and where: ['blocks', 2, 'rounds']. The code is one of ours or zod's. */
export type SessionFault = { path: (string | number)[]; code: string };

/** Reads a session from outside; every fault is named with its place, and nothing is mended silently. */
export function readSession(
	input: unknown
):
	| { ok: true; content: SessionContent }
	| (Refused<'session-malformed'> & { faults: SessionFault[] }) {
	const read = sessionContent.safeParse(input);
	if (read.success) return { ok: true, content: read.data };
	const faults = read.error.issues.map((issue) => ({
		path: issue.path.map((step) => (typeof step === 'symbol' ? String(step) : step)),
		code: issue.code === 'custom' ? issue.message : issue.code.replaceAll('_', '-')
	}));
	return { ...refuse('session-malformed', { faults: faults.length }), faults };
}
