import { json } from '@sveltejs/kit';
import { isHealthy } from '$lib/server/health';
import { problem } from '$lib/server/refuse';

/** 200 once migrations ran and the database answers. */
export async function GET() {
	return (await isHealthy())
		? json({ status: 'ok' }, { headers: { 'cache-control': 'no-store' } })
		: problem({ code: 'not-ready' });
}
