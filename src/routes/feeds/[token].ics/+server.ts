import { error } from '@sveltejs/kit';
import { env } from '$lib/server/env';
import { readFeed } from '$lib/server/feeds/read';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = async (event) => {
	const { now, gym } = event.locals;
	const asked = { token: event.params.token, address: event.getClientAddress(), now };
	const feed = await readFeed(asked, { gymName: gym!.name, origin: env().origin });
	if (feed === 'too-many') error(429, { message: '', code: 'too-many-tries' });
	if (feed === null) error(404);
	const headers = {
		etag: feed.etag,
		'cache-control': 'private, max-age=0, must-revalidate',
		'referrer-policy': 'no-referrer'
	};
	if (event.request.headers.get('if-none-match')?.split(/,\s*/).includes(feed.etag)) {
		return new Response(null, { status: 304, headers });
	}
	return new Response(feed.body, {
		headers: { ...headers, 'content-type': 'text/calendar; charset=utf-8' }
	});
};
