import type { Rules } from './rule';

const read = { GET: 'schedule:write' } as const;

export const rules: Rules = {
	'/(plan)/plan': read,
	'/(plan)/plan/week': read,
	'/(plan)/plan/week/[week=date]': { ...read, 'POST ?/publish': 'schedule:write' },
	'/(plan)/plan/week/[week=date]/lay': { ...read, 'POST ?/default': 'schedule:write' },
	'/(plan)/plan/week/[week=date]/slots/new': { ...read, 'POST ?/default': 'schedule:write' },
	'/(plan)/plan/week/[week=date]/slots/[slot=id]': {
		...read,
		'POST ?/change': 'schedule:write',
		'POST ?/callOff': 'schedule:write',
		'POST ?/bringBack': 'schedule:write'
	},
	'/(plan)/plan/kit': {
		GET: 'kit:write',
		'POST ?/addGroup': 'kit:write',
		'POST ?/archiveGroup': 'kit:write',
		'POST ?/addItem': 'kit:write',
		'POST ?/changeItem': 'kit:write',
		'POST ?/archiveItem': 'kit:write',
		'POST ?/addSpell': 'kit:write',
		'POST ?/endSpell': 'kit:write'
	},
	'/(plan)/plan/movements': { GET: 'movements:write' },
	'/(plan)/plan/movements/new': { GET: 'movements:write', 'POST ?/save': 'movements:write' },
	'/(plan)/plan/movements/[movement=id]': {
		GET: 'movements:write',
		'POST ?/save': 'movements:write',
		'POST ?/archive': 'movements:write'
	},
	'/(plan)/plan/sessions': { GET: 'sessions:write' },
	'/(plan)/plan/sessions/[session=id]': {
		GET: 'sessions:write',
		'POST ?/save': 'sessions:write',
		'POST ?/copy': 'sessions:write',
		'POST ?/archive': 'sessions:write'
	},
	'/(plan)/plan/sessions/new': { GET: 'sessions:write', 'POST ?/save': 'sessions:write' },
	'/(plan)/plan/shortages': read,
	'/(plan)/plan/timetable': read,
	'/(plan)/plan/timetable/rooms': {
		...read,
		'POST ?/add': 'schedule:write',
		'POST ?/edit': 'schedule:write',
		'POST ?/archive': 'schedule:write',
		'POST ?/bringBack': 'schedule:write'
	},
	'/(plan)/plan/timetable/class-types': {
		...read,
		'POST ?/archive': 'schedule:write',
		'POST ?/bringBack': 'schedule:write'
	},
	'/(plan)/plan/timetable/class-types/new': { ...read, 'POST ?/default': 'schedule:write' },
	'/(plan)/plan/timetable/class-types/[type=id]': { ...read, 'POST ?/default': 'schedule:write' },
	'/(plan)/plan/timetable/closures': {
		...read,
		'POST ?/close': 'schedule:write',
		'POST ?/end': 'schedule:write'
	},
	'/(plan)/plan/timetable/series/new': {
		...read,
		'POST ?/add': 'schedule:write',
		'POST ?/dates': 'schedule:write'
	},
	'/(plan)/plan/timetable/series/[series=id]': {
		...read,
		'POST ?/edit': 'schedule:write',
		'POST ?/end': 'schedule:write',
		'POST ?/dates': 'schedule:write'
	}
};
