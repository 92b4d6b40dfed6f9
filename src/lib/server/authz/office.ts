import type { Rules } from './rule';

export const rules: Rules = {
	'/(office)/office/settings': { GET: 'settings:write', 'POST ?/default': 'settings:write' },
	'/(office)/office/people': {
		GET: 'staff:write',
		'POST ?/invite': 'staff:write',
		'POST ?/grant': 'staff:write',
		'POST ?/revoke': 'staff:write',
		'POST ?/shut': 'staff:write',
		'POST ?/reopen': 'staff:write'
	},
	'/(office)/office/audit': { GET: 'audit:read' }
};
