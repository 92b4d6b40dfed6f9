import { error, json } from '@sveltejs/kit';
import { rollBody } from '$lib/forms/api';
import { readBody } from '$lib/server/api/read';
import { writeRoll } from '$lib/server/api/write-roll';
import { requireViewer } from '$lib/server/guard';
import { problem } from '$lib/server/refuse';
import { markRoll } from '$lib/server/roll/mark';
import { mayTakeRoll, rollOf } from '$lib/server/roll/queries';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = async (event) => {
	const viewer = requireViewer(event, ['roll:take', 'floor:read-own']);
	const slotId = Number(event.params.id);
	if (!(await mayTakeRoll(viewer, slotId))) error(404);
	return json(writeRoll(slotId, await rollOf(slotId), event.locals.gym!.zone));
};

export const PATCH: RequestHandler = async (event) => {
	const viewer = requireViewer(event, ['roll:take', 'floor:read-own']);
	const body = await readBody(event, rollBody);
	if (!body.ok) return body.answer;
	const slotId = Number(event.params.id);
	const marks = body.data.marks.map(({ at, ...mark }) => ({
		...mark,
		...(at === undefined ? {} : { at: Date.parse(at) })
	}));
	const marked = await markRoll(viewer, slotId, marks, { now: event.locals.now });
	if (!marked.ok) return problem(marked);
	return json(writeRoll(slotId, await rollOf(slotId), event.locals.gym!.zone));
};
