import type { Viewer } from '../guard';
import { rules as api } from './api';
import { rules as coach } from './coach';
import { rules as desk } from './desk';
import { rules as feeds } from './feeds';
import { rules as member } from './member';
import { rules as office } from './office';
import { rules as plan } from './plan';
import { rules as open } from './public';
import type { Rule, Rules } from './rule';

export type { Rule, Rules } from './rule';

/** Every route and method that exists. What has no rule here is refused. */
export const rules: Rules = {
	...open,
	...member,
	...coach,
	...desk,
	...plan,
	...office,
	...api,
	...feeds
};

/** The key of a request within its route; HEAD is read as GET. */
export function ruleKey(method: string, url: URL, ofRoute: Record<string, Rule>): string {
	if (method === 'HEAD') return 'GET';
	if (method !== 'POST') return method;
	const named = actionName(url);
	if (named !== null) return `POST ?/${named}`;
	return 'POST' in ofRoute ? 'POST' : 'POST ?/default';
}

/** The form action that a query asks for, as the framework reads it; null when it names none. */
export function actionName(url: URL): string | null {
	for (const name of url.searchParams.keys()) {
		if (name.startsWith('/')) return name.slice(1);
	}
	return null;
}

export function allows(rule: Rule, viewer: Viewer | null): boolean {
	if (rule === 'anyone') return true;
	if (!viewer) return false;
	if (rule === 'signed-in') return true;
	const any = typeof rule === 'string' ? [rule] : rule;
	return any.some((capability) => viewer.capabilities.has(capability));
}
