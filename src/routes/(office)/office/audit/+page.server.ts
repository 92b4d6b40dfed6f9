import { auditFilterForm } from '$lib/forms/audit-filter';
import { auditPageSize, listActors, listAreas, listAudit } from '$lib/server/audit/queries';
import { requireViewer } from '$lib/server/guard';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	requireViewer(event, 'audit:read');
	const filter = auditFilterForm.parse(Object.fromEntries(event.url.searchParams));
	const [rows, actors, areas] = await Promise.all([
		listAudit({ before: filter.before, actorId: filter.who, verb: filter.area }),
		listActors(),
		listAreas()
	]);
	return {
		filter,
		entries: rows.slice(0, auditPageSize),
		older: rows.length > auditPageSize ? (rows[auditPageSize - 1]?.id ?? null) : null,
		actors,
		areas
	};
};
