import { json } from '@sveltejs/kit';
import { bookingBody } from '$lib/forms/api';
import { readBody } from '$lib/server/api/read';
import { answerOnce } from '$lib/server/api/repeat';
import { book } from '$lib/server/bookings/book';
import { requireViewer } from '$lib/server/guard';
import { problem } from '$lib/server/refuse';
import type { RequestHandler } from './$types';

export const POST: RequestHandler = async (event) => {
	const viewer = requireViewer(event, ['bookings:write-own', 'bookings:write-any']);
	const body = await readBody(event, bookingBody);
	if (!body.ok) return body.answer;
	const { now } = event.locals;
	const slotId = Number(event.params.id);
	const key = event.request.headers.get('idempotency-key');
	const asked = { personId: viewer.personId, key, route: event.url.pathname, body: body.data, now };
	return answerOnce(asked, async (keep) =>
		answer(
			await book(viewer, slotId, { ...body.data, now }, (tx, booked) => keep(tx, answer(booked)))
		)
	);
};

function answer(booked: Awaited<ReturnType<typeof book>>): Response {
	if (!booked.ok) return problem(booked);
	const { booking, offer } = booked;
	return json({ booking, ...(offer ? { offer } : {}) }, { status: 201 });
}
