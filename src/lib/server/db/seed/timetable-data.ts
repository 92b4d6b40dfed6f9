import type { Weekday } from '$lib/domain/calendar';

/** Class types of the demo gym. `claims` count where no session is laid. */
export const classTypeData = [
	{
		key: 'strength',
		name: 'Strength',
		about: 'Heavy work in small numbers, one hour, everybody at their own load.',
		colour: 'pine',
		lengthMin: 60,
		programme: 'Strength',
		priceCents: 1600,
		cutOffMin: 120,
		cutOffClock: null,
		peoplePerCoach: 18,
		claims: [{ group: 'db', quantity: 1 }]
	},
	{
		key: 'partners',
		name: 'Saturday partners',
		about: 'In pairs, loud and friendly. Bring somebody or find somebody.',
		colour: 'moss',
		lengthMin: 60,
		programme: 'Strength',
		priceCents: 1600,
		cutOffMin: 180,
		cutOffClock: null,
		peoplePerCoach: 16,
		claims: []
	},
	{
		key: 'engine',
		name: 'Lunch engine',
		about: 'Forty-five minutes of breathing hard, back at the desk in time.',
		colour: 'fern',
		lengthMin: 45,
		programme: 'Engine',
		priceCents: 1400,
		cutOffMin: 60,
		cutOffClock: null,
		peoplePerCoach: 18,
		claims: []
	},
	{
		key: 'intervals',
		name: 'Long intervals',
		about: 'Rowing, running, stepping, with breaks that are long enough.',
		colour: 'sage',
		lengthMin: 45,
		programme: 'Engine',
		priceCents: 1400,
		cutOffMin: null,
		cutOffClock: '20:00',
		peoplePerCoach: 12,
		claims: []
	},
	{
		key: 'basics',
		name: 'Loft basics',
		about: 'For the first weeks, or for getting back: the shapes, slowly.',
		colour: 'stone',
		lengthMin: 45,
		programme: 'Minimal kit',
		priceCents: 1200,
		cutOffMin: 120,
		cutOffClock: null,
		peoplePerCoach: 10,
		claims: []
	},
	{
		key: 'floor',
		name: 'Bare floor',
		about: 'Little kit, much tension.',
		colour: 'sand',
		lengthMin: 45,
		programme: 'Minimal kit',
		priceCents: 1200,
		cutOffMin: 120,
		cutOffClock: null,
		peoplePerCoach: 10,
		claims: []
	}
] as const;
export type ClassKey = (typeof classTypeData)[number]['key'];

export type SeriesData = {
	/** Places set by hand. */
	setPlaces?: number;
	type: ClassKey;
	room: 'floor' | 'loft';
	coach: 'head' | 'coach' | 'adaeze' | 'ruairi';
	time: string;
	days: Weekday[];
};

const weekdays: Weekday[] = ['MO', 'TU', 'WE', 'TH', 'FR'];

/** Forty-five classes a week on all days but Sunday; no coach is in two places. */
export const seriesData: SeriesData[] = [
	{ type: 'strength', room: 'floor', coach: 'head', time: '06:30', days: ['MO', 'WE', 'TH'] },
	{ type: 'strength', room: 'floor', coach: 'coach', time: '06:30', days: ['TU', 'FR'] },
	{ type: 'strength', room: 'floor', coach: 'adaeze', time: '09:30', days: weekdays },
	{ type: 'engine', room: 'floor', coach: 'coach', time: '12:15', days: weekdays },
	{ type: 'strength', room: 'floor', coach: 'head', time: '17:30', days: ['MO', 'WE', 'FR'] },
	{ type: 'strength', room: 'floor', coach: 'adaeze', time: '17:30', days: ['TU', 'TH'] },
	{ type: 'strength', room: 'floor', coach: 'coach', time: '18:40', days: weekdays },
	{ type: 'partners', room: 'floor', coach: 'head', time: '09:00', days: ['SA'] },
	{ type: 'partners', room: 'floor', coach: 'coach', time: '10:15', days: ['SA'] },
	{ type: 'strength', room: 'floor', coach: 'adaeze', time: '11:30', days: ['SA'] },
	{ type: 'intervals', room: 'loft', coach: 'ruairi', time: '07:00', days: weekdays },
	{ type: 'floor', room: 'loft', coach: 'ruairi', time: '17:45', days: weekdays },
	{
		type: 'basics',
		room: 'loft',
		coach: 'adaeze',
		time: '18:40',
		days: ['MO', 'WE', 'FR'],
		setPlaces: 8
	},
	{
		type: 'basics',
		room: 'loft',
		coach: 'ruairi',
		time: '18:40',
		days: ['TU', 'TH'],
		setPlaces: 8
	},
	{ type: 'basics', room: 'loft', coach: 'ruairi', time: '09:30', days: ['SA'] },
	{ type: 'floor', room: 'loft', coach: 'ruairi', time: '10:45', days: ['SA'] }
];

const strengthByDay = [
	[
		'Tempo squat & row',
		'Pull day, light bells',
		'Hinge & carry',
		'Push day, slow lowers',
		'Rings and legs',
		'Saturday partners'
	],
	[
		'Heavy and few',
		'Pull day, light bells',
		'Hinge & carry',
		'Bells in pairs',
		'Rings and legs',
		'Saturday partners'
	]
];
const engineByDay = [
	'Skip and shuttle',
	'Thirty on, thirty off',
	'Bike, bell, box',
	'Every minute, honest',
	'Two eights',
	'Saturday engine'
];
const floorByDay = [
	'Nothing but floor',
	'Rings in the Loft',
	'Slow lowers, no bar',
	'Step and brace',
	'Hips and shoulders',
	'Bands everywhere'
];

/** The session of a class: by its type, the day of the week (0 is Monday) and the week. */
export function sessionFor(type: ClassKey, day: number, week: number): string {
	if (type === 'strength')
		return day === 5 ? 'Heavy and few' : strengthByDay[Math.abs(week) % 2]![day]!;
	if (type === 'partners') return 'Saturday partners';
	if (type === 'engine') return engineByDay[day]!;
	if (type === 'intervals') return 'Long intervals';
	if (type === 'basics') return Math.abs(week) % 4 === 3 ? 'Deload floor' : 'Loft basics';
	return floorByDay[day]!;
}

/** The last week is laid as far as Wednesday: what comes after waits for the head coach. */
export const isLaid = (day: number, week: number): boolean => week <= 3 || (week === 4 && day <= 2);

/** Days on which a room is shut, by week from now and day (0 is Monday). */
export const closureData = [
	{ room: 'loft', week: 3, day: 3, why: 'The floor of the Loft is sealed' }
] as const;

/** Classes called off, by week from now, day and time. */
export const calledOffData = [
	{ week: -2, day: 3, time: '17:45', why: 'Ruairi is ill' },
	{ week: 2, day: 4, time: '12:15', why: 'Tomasz is on a course' }
] as const;

/** The one clash of next week: both rooms row at the same minute on Wednesday morning. */
export const clash = { day: 2, time: '06:30', session: 'Row and carry' };
