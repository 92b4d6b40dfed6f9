import { redirect, type RequestEvent } from '@sveltejs/kit';
import { allows, ruleKey, rules, type Rules } from './authz';
import { isApi, signInAddress } from './guard';
import { log } from './log';

type Asked = Pick<RequestEvent, 'locals' | 'url' | 'route' | 'request' | 'isDataRequest'>;

/**
 * Deny by default, before any load, action or endpoint runs: the code of the refusal, or null.
 * A route or method without a rule does not exist for anybody.
 */
export function refusedByRule(event: Asked, table: Rules = rules): string | null {
	if (event.route.id === null) return null;
	const ofRoute = table[event.route.id];
	if (!ofRoute) {
		log.error({ route: event.route.id }, 'route without a rule');
		return 'not-allowed';
	}
	if (event.request.method === 'OPTIONS') return null;
	const key = ruleKey(event.request.method, event.url, ofRoute);
	if (!Object.hasOwn(ofRoute, key)) return key.includes('?/') ? 'no-action' : 'no-method';

	const rule = ofRoute[key];
	if (rule !== undefined && allows(rule, event.locals.viewer)) return null;
	if (event.locals.viewer) return 'not-allowed';
	if (isApi(event)) return 'signed-out';
	redirect(303, signInAddress(event.url));
}
