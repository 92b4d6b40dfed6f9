import type { Rules } from './rule';

export const rules: Rules = {
	'/(desk)/desk': { GET: 'roll:take' },
	'/(desk)/desk/[slot=id]': {
		GET: 'roll:take',
		'POST ?/mark': ['roll:take', 'floor:read-own'],
		'POST ?/close': ['roll:take', 'floor:read-own'],
		'POST ?/give': 'bookings:write-any'
	},
	'/(desk)/desk/[slot=id]/walk-in': {
		GET: 'bookings:write-any',
		'POST ?/enter': 'bookings:write-any',
		'POST ?/give': 'bookings:write-any'
	},
	'/(desk)/desk/people': { GET: 'people:read', 'POST ?/add': 'people:write' },
	'/(desk)/desk/people/[person=id]': {
		GET: 'people:read',
		'POST ?/change': 'people:write',
		'POST ?/grant': 'passes:grant',
		'POST ?/correct': 'passes:grant',
		'POST ?/endPass': 'passes:grant',
		'POST ?/cancel': 'bookings:write-any'
	}
};
