import type { Rules } from './rule';

export const rules: Rules = {
	'/(member)/classes': { GET: 'anyone' }
};
