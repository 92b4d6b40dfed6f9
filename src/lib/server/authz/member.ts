import type { Rules } from './rule';

export const rules: Rules = {
	'/(member)/booked': { GET: 'bookings:write-own' },
	'/(member)/classes': { GET: 'anyone' },
	'/(member)/classes/[slot=id]': {
		GET: 'anyone',
		'POST ?/book': 'bookings:write-own',
		'POST ?/cancel': 'bookings:write-own',
		'POST ?/choose': 'bookings:write-own'
	},
	'/(member)/me': {
		GET: 'signed-in',
		'POST ?/about': 'signed-in',
		'POST ?/addFeed': 'signed-in',
		'POST ?/everywhere': 'signed-in',
		'POST ?/replaceFeed': 'signed-in',
		'POST ?/revokeFeed': 'signed-in'
	}
};
