import { json } from '@sveltejs/kit';
import { answerOnce } from '$lib/server/api/repeat';
import { cancel } from '$lib/server/bookings/cancel';
import { requireViewer } from '$lib/server/guard';
import { problem } from '$lib/server/refuse';
import type { RequestHandler } from './$types';

export const DELETE: RequestHandler = async (event) => {
	const viewer = requireViewer(event, ['bookings:write-own', 'bookings:write-any']);
	const { now } = event.locals;
	const key = event.request.headers.get('idempotency-key');
	const asked = { personId: viewer.personId, key, route: event.url.pathname, body: null, now };
	return answerOnce(asked, async (keep) =>
		answer(
			await cancel(viewer, Number(event.params.id), { now }, (tx, cancelled) =>
				keep(tx, answer(cancelled))
			)
		)
	);
};

const answer = (cancelled: Awaited<ReturnType<typeof cancel>>): Response =>
	cancelled.ok ? json({ booking: cancelled.booking }) : problem(cancelled);
