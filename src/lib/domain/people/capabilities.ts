export const roles = ['owner', 'head_coach', 'coach', 'front_desk', 'member'] as const;
export type Role = (typeof roles)[number];

/** What somebody may do. Routes, commands and the API ask for these, never for a role. */
export const capabilities = [
	/** Book, wait and cancel for oneself. */
	'bookings:write-own',
	/** Book and cancel for anybody, walk-ins too. */
	'bookings:write-any',
	/** See every class with its kit and its people. */
	'schedule:read-all',
	/** Class types, rooms, series, closures; lay sessions on slots; publish a week. */
	'schedule:write',
	/** See the classes that one coaches: the people, their choices, the kit to put out. */
	'floor:read-own',
	/** Take the roll of any class; a coach takes that of their own without it. */
	'roll:take',
	'kit:write',
	'movements:write',
	'sessions:write',
	/** Look up members, with their passes and bookings. */
	'people:read',
	/** Change a member's details. */
	'people:write',
	'passes:grant',
	/** Invite staff, grant and revoke roles, shut an account. */
	'staff:write',
	'settings:write',
	'audit:read'
] as const;
export type Capability = (typeof capabilities)[number];

const grants: Record<Role, readonly Capability[]> = {
	owner: capabilities.filter((c) => c !== 'floor:read-own' && c !== 'bookings:write-own'),
	head_coach: [
		'schedule:read-all',
		'schedule:write',
		'floor:read-own',
		'roll:take',
		'kit:write',
		'movements:write',
		'sessions:write',
		'people:read'
	],
	coach: ['schedule:read-all', 'floor:read-own'],
	front_desk: [
		'schedule:read-all',
		'bookings:write-any',
		'roll:take',
		'people:read',
		'people:write',
		'passes:grant'
	],
	member: ['bookings:write-own']
};

/** The union of what each role grants. */
export function capabilitiesOf(held: readonly Role[]): Set<Capability> {
	return new Set(held.flatMap((role) => grants[role]));
}
