import { fail, type ActionFailure, type RequestEvent } from '@sveltejs/kit';
import type { z } from 'zod';
import type { Refused } from '$lib/domain/refusal';
import { readForm, type Typed } from '$lib/forms/read-form';
import { refusalSentence } from '$lib/wording/refusals';
import { requireViewer, type Viewer } from './guard';
import { statusOf } from './refuse';
import { safeForm } from './safe-body';
import type { Sight } from './slots/look';

/** A refused plan form: what was typed, and what there is to see before it may be confirmed. */
export type RefusedPlan = {
	refused: string;
	sentence: string;
	values: Typed;
	errors: Record<string, string>;
	sight: Sight | null;
};

/** What the plan's forms have in common: guard, read, one command; a refusal keeps what was typed. */
export async function planForm<Form, Answer extends { ok: true } | Refused>(
	event: RequestEvent,
	schema: z.ZodType<Form>,
	command: (viewer: Viewer, form: Form) => Promise<Answer>
): Promise<Extract<Answer, { ok: true }> | ActionFailure<RefusedPlan>> {
	const viewer = requireViewer(event, 'schedule:write');
	const read = readForm(schema, await safeForm(event));
	if (!read.ok) return failPlan({ ok: false, refused: 'bad-input' }, read.values, read.errors);
	const answer = await command(viewer, read.data);
	if (isDone(answer)) return answer;
	return failPlan(answer as Refused, read.typed);
}

const isDone = <Answer extends { ok: boolean }>(
	answer: Answer
): answer is Extract<Answer, { ok: true }> => answer.ok;

function failPlan(refusal: Refused, values: Typed, errors: Record<string, string> = {}) {
	const { refused, detail } = refusal;
	return fail(statusOf(refused), {
		refused,
		sentence: refusalSentence(refused, detail),
		values: { ...values },
		errors,
		sight: 'sight' in refusal ? (refusal.sight as Sight) : null
	});
}
