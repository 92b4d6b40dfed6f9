import type { Role } from './capabilities';

/** Where each role starts its day; who holds several starts where people wait for them first. */
const homes: [Role, string][] = [
	['front_desk', '/desk'],
	['head_coach', '/plan/week'],
	['coach', '/floor'],
	['owner', '/office/people'],
	['member', '/classes']
];

export const homeOf = (held: readonly Role[]): string =>
	homes.find(([role]) => held.includes(role))?.[1] ?? '/classes';
