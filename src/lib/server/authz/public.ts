import type { Rules } from './rule';

export const rules: Rules = {
	'/(public)/parts': { GET: 'anyone' },
	'/': { GET: 'anyone' },
	'/(public)/sign-in': { GET: 'anyone', 'POST ?/link': 'anyone', 'POST ?/password': 'anyone' },
	'/(public)/sign-in/link': { GET: 'anyone', 'POST ?/default': 'anyone' },
	'/(public)/sign-up': { GET: 'anyone', 'POST ?/default': 'anyone' },
	'/(public)/sign-out': { GET: 'anyone', 'POST ?/default': 'anyone' },
	'/(public)/theme': { POST: 'signed-in' },
	'/(public)/first-run': { GET: 'anyone', 'POST ?/default': 'anyone' }
};
