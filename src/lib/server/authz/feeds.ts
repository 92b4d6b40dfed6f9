import type { Rules } from './rule';

export const rules: Rules = {
	'/feeds/[token].ics': { GET: 'anyone' }
};
