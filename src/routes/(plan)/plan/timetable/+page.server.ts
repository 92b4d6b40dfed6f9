import { sayRule } from '$lib/domain/calendar/say-rule';
import { requireViewer } from '$lib/server/guard';
import { listSeries } from '$lib/server/series/list';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	requireViewer(event, 'schedule:write');
	const zone = event.locals.gym?.zone ?? 'UTC';
	const series = await listSeries(event.locals.now);
	return { series: series.map((row) => ({ ...row, said: sayRule(row.rule, zone) })) };
};
