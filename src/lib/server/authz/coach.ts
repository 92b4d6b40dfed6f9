import type { Rules } from './rule';

export const rules: Rules = {
	'/(coach)/floor': { GET: 'floor:read-own' },
	'/(coach)/floor/[slot=id]': {
		GET: 'floor:read-own',
		'POST ?/mark': ['roll:take', 'floor:read-own'],
		'POST ?/close': ['roll:take', 'floor:read-own']
	}
};
